import type { DemoSound } from './demo-notes.ts';

/** What was looked at and found sound. */
export const DEMO_SOUNDS: DemoSound[] = [
  {
    with: 'rosa/-59/15:40',
    place: { partId: 'covering_board', side: 'port', words: 'under it' },
    known: 'opened',
    about: 'rot',
  },
  {
    with: 'rosa/-58/15:50',
    place: { partId: 'deck_beam', side: 'starboard', number: 3 },
    known: 'sounded',
    about: 'rot',
  },
  {
    with: 'rosa/-58/15:50',
    place: { partId: 'deck_beam', side: 'starboard', number: 5 },
    known: 'sounded',
    about: 'rot',
  },
  {
    with: 'wes/-57/15:40',
    place: { partId: 'deck_beam', side: 'port', number: 4 },
    known: 'opened',
    about: 'rot',
    text: 'Other end is bright.',
  },
  {
    with: 'hob/-57/15:55',
    place: { partId: 'sheer_clamp', side: 'both', number: 1, toNumber: 14 },
    known: 'probed',
    about: 'rot',
  },
  {
    with: 'rosa/-28/15:40',
    place: { partId: 'bottom', side: 'starboard' },
    known: 'seen',
    text: 'Sound where the paint came off in sheets.',
  },
  {
    with: 'rosa/-20/11:50',
    place: { partId: 'floor_timber', side: 'port', number: 6 },
    known: 'probed',
    about: 'rot',
  },
  {
    with: 'rosa/-20/11:50',
    place: { partId: 'floor_timber', side: 'port', number: 8 },
    known: 'probed',
    about: 'rot',
  },
  {
    with: 'rosa/-20/16:00',
    place: { partId: 'engine_bed', side: 'both' },
    known: 'probed',
    about: 'rot',
    text: 'Hard all the way.',
  },
  { with: 'rosa/-20/16:00', place: { partId: 'side_plank', side: 'port' }, known: 'sounded' },
  {
    with: 'rosa/-19/15:50',
    place: { partId: 'fastenings', side: 'starboard', number: 4, toNumber: 6 },
    known: 'opened',
    about: 'corroded_fastening',
    text: 'Four drawn, four good.',
  },
  {
    with: 'rosa/-19/15:50',
    place: { partId: 'deck_beam', side: 'both', number: 1, toNumber: 5 },
    known: 'sounded',
    about: 'rot',
  },
  {
    with: 'wes/-17/15:50',
    place: { partId: 'stringer', side: 'starboard', words: 'behind floor 7' },
    known: 'probed',
    about: 'rot',
  },
  {
    with: 'rosa/-15/15:50',
    place: { partId: 'stem', side: 'centre', words: 'heel and gripe' },
    known: 'probed',
    about: 'rot',
  },
  {
    with: 'hob/-22/15:50',
    place: { partId: 'lap', side: 'both', words: 'edges, from inside' },
    known: 'seen',
  },
  {
    with: 'hob/-13/15:50',
    place: { partId: 'bent_rib', side: 'both', number: 1, toNumber: 8 },
    known: 'sounded',
    about: 'broken_member',
  },
];
