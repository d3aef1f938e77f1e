/** Where a part's word is not its id with spaces. */
const WORDS: Readonly<Record<string, string>> = {
  coaming: 'cockpit coaming',
  topside_seam: 'side seam',
  lap: 'plank lap',
  bottom_membrane: 'cloth between layers',
  bent_rib: 'steam-bent rib',
  ceiling: 'ceiling planking',
  cabinetry: 'joinery and lockers',
  carburetor: 'carburettor',
  transmission: 'gearbox',
  shaft: 'propeller shaft',
  thru_hull: 'through-hull fitting',
  rub_rail_cap: 'metal rub rail cap',
  hardware_all: 'deck hardware',
  bolt_keel: 'keel bolts',
  centerboard: 'centreboard',
  centerboard_trunk: 'centreboard case',
};

/** What a part is called: small enough for every screen, where the list itself is not. */
export function partWords(partId: string): string {
  return WORDS[partId] ?? partId.replaceAll('_', ' ');
}
