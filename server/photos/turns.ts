/** Lets one piece of work go at a time, in the order asked. */
export class Turns {
  private last: Promise<unknown> = Promise.resolve();

  take<T>(work: () => Promise<T>): Promise<T> {
    const turn = this.last.then(work);
    this.last = turn.catch(() => undefined); // a turn that failed is told to whoever took it, and holds nobody up
    return turn;
  }
}
