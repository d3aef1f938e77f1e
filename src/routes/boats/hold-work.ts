/**
 * Holds one after another, and tells after each how many are kept. Begins behind the first `kept`, so that a list that
 * was broken off goes on where it stopped. Rejects as `hold` does, with nothing held behind that.
 */
export async function holdInTurn<Holding>(
  hold: (holding: Holding) => Promise<unknown>,
  holdings: Holding[],
  kept: number,
  onKept: (count: number) => void,
): Promise<void> {
  for (let index = kept; index < holdings.length; index += 1) {
    await hold(holdings[index]!);
    onKept(index + 1);
  }
}
