/** Where a kind's word is not its id with spaces. */
const WORDS: Readonly<Record<string, string>> = {
  glue_failure: 'glue joint failed',
  check: 'drying check',
  loose_bung: 'loose or missing bung',
  finish_failure: 'finish failing',
  sand_through: 'sanded through',
  finish_defect: 'fault in a fresh coat',
  blush: 'bloom or blush',
  poor_repair: 'poor earlier repair',
  as_built: 'as built, leave it',
  filler: 'filler over damage',
  delamination: 'plywood delaminated',
  borers: 'worm or borers',
  wear: 'wear or chafe',
  oil_soak: 'oil-soaked wood',
  metal_corrosion: 'metal corroded',
  original_evidence: 'sign of the original',
  nonoriginal_part: 'not original',
  missing_part: 'part missing',
  lead_suspect: 'may hold lead',
  hogged: 'out of shape',
  pest: 'nest or insects',
  stiff: 'stiff, out of adjustment',
};

/** What a kind of finding is called; the shop's own kinds are their own words. */
export function findingWords(kind: string): string {
  return WORDS[kind] ?? kind.replaceAll('_', ' ');
}
