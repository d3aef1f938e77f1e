import type { PhotoAttach } from '#shared/photo/photo.ts';
import type { Place } from '#shared/place/place.ts';
import type { PictureName } from './pictures/album.ts';

/** A picture as somebody took it. */
export interface DemoPhoto {
  of: PictureName;
  /** the entry that it was sent with, by its name */
  with: string;
  finding?: string;
  place?: Place;
  set?: PhotoAttach['set'];
  caption?: string;
}

const port = (partId: string, more: Place = {}): Place => ({ partId, side: 'port', ...more });
const starboard = (partId: string, more: Place = {}): Place => ({ partId, side: 'starboard', ...more });
const centre = (partId: string, more: Place = {}): Place => ({ partId, side: 'centre', ...more });

const ARRIVED = 'rosa/-55/15:40';

const PENNY: DemoPhoto[] = [
  { of: 'pennyPort', with: ARRIVED, set: 'arrival', place: port('topsides') },
  { of: 'pennyStarboard', with: ARRIVED, set: 'arrival', place: starboard('topsides') },
  { of: 'pennyTransom', with: ARRIVED, set: 'arrival', place: centre('transom') },
  { of: 'pennyDeck', with: ARRIVED, set: 'arrival', place: centre('foredeck') },
  {
    of: 'pennyCockpit',
    with: ARRIVED,
    set: 'arrival',
    place: centre('cockpit_sole'),
    caption: 'As she came, two panels already loose',
  },
  { of: 'pennySide', with: ARRIVED, set: 'arrival', place: port('side_plank', { number: 4, toNumber: 7 }) },
  { of: 'pennyPaint', with: ARRIVED, set: 'arrival', place: starboard('bottom') },
  {
    of: 'pennyNumber',
    with: ARRIVED,
    finding: 'number',
    set: 'mark',
    place: centre('stem'),
    caption: 'Do not sand',
  },
  { of: 'pennyBed', with: 'wes/-48/16:10', finding: 'bedOil', place: starboard('engine_bed') },
  { of: 'pennyBedClean', with: 'rosa/-45/15:20', place: starboard('engine_bed') },
  {
    of: 'pennySplit',
    with: 'wes/-38/15:45',
    place: port('side_plank', { words: 'under the windshield' }),
    caption: 'Old dutchman, a good one',
  },
  { of: 'pennyTransomStripped', with: 'rosa/-25/15:50', set: 'after', place: centre('transom') },
  { of: 'pennyStripped', with: 'wes/-25/15:45', set: 'after', place: starboard('topsides') },
  { of: 'soleUp', with: 'rosa/-20/11:50', place: port('cockpit_sole') },
  {
    of: 'floorSoft',
    with: 'rosa/-20/11:50',
    finding: 'floorPort',
    set: 'before',
    place: port('floor_timber', { number: 7 }),
  },
  {
    of: 'muck',
    with: 'wes/-20/15:55',
    finding: 'limbersShut',
    set: 'before',
    place: centre('bilge'),
    caption: 'And the spoon',
  },
  {
    of: 'screws',
    with: 'wes/-19/15:35',
    finding: 'screwsPort',
    place: port('fastenings', { number: 4, toNumber: 9 }),
  },
  { of: 'screwsGood', with: 'rosa/-19/15:50', place: starboard('fastenings', { number: 4, toNumber: 6 }) },
  {
    of: 'beams',
    with: 'rosa/-19/15:50',
    place: { partId: 'deck_beam', side: 'both', number: 1, toNumber: 5 },
  },
  { of: 'coveringBoard', with: 'rosa/-18/15:40', finding: 'coveringBlack', place: port('covering_board') },
  {
    of: 'floorOpen',
    with: 'rosa/-17/15:40',
    finding: 'floorPort',
    set: 'before',
    place: port('floor_timber', { number: 7 }),
  },
  { of: 'stringer', with: 'rosa/-17/15:40', finding: 'stringerPort', set: 'before', place: port('stringer') },
  {
    of: 'floorStarboard',
    with: 'wes/-17/15:50',
    finding: 'floorStarboard',
    set: 'before',
    place: starboard('floor_timber', { number: 7 }),
  },
  {
    of: 'floorCut',
    with: 'cutRot',
    finding: 'floorPort',
    place: port('floor_timber', { number: 7 }),
    caption: 'Bright wood',
  },
  {
    of: 'floorSpliced',
    with: 'wes/-8/11:05',
    finding: 'floorStarboard',
    set: 'after',
    place: starboard('floor_timber', { number: 7 }),
  },
  {
    of: 'ribCracked',
    with: 'rosa/-9/15:55',
    finding: 'ribPort',
    set: 'before',
    place: port('frame', { number: 9 }),
  },
  { of: 'stringerScarf', with: 'rosa/-7/15:45', finding: 'stringerPort', place: port('stringer') },
  { of: 'sisterClamped', with: 'sister', finding: 'ribPort', place: port('frame', { number: 9 }) },
  {
    of: 'sisterRiveted',
    with: 'wes/-4/15:50',
    finding: 'ribPort',
    set: 'after',
    place: port('frame', { number: 8, toNumber: 9 }),
  },
  { of: 'roves', with: 'rosa/-4/15:55', place: port('frame', { number: 8 }) },
  {
    of: 'bilgeClean',
    with: 'rosa/-3/15:30',
    set: 'before-closing',
    place: { partId: 'bilge', number: 4, toNumber: 10 },
  },
  { of: 'garboard', with: 'garboard', place: port('garboard') },
  {
    of: 'primer',
    with: 'primer',
    set: 'before-closing',
    place: { partId: 'frame', side: 'both', number: 4, toNumber: 7 },
  },
  {
    of: 'primerBilge',
    with: 'wes/-1/15:55',
    set: 'before-closing',
    place: port('bilge', { number: 8, toNumber: 10 }),
  },
];

const WIDDER: DemoPhoto[] = [
  { of: 'dutchman', with: 'rosa/-63/15:40', place: starboard('side_plank', { number: 3 }) },
  {
    of: 'widderTransom',
    with: 'tamsin/-63/15:50',
    finding: 'transomCorner',
    set: 'before',
    place: port('transom'),
  },
  {
    of: 'widderSide',
    with: 'tamsin/-58/15:40',
    place: starboard('topsides'),
    caption: 'Proud till they are hard',
  },
  { of: 'underBoards', with: 'rosa/-59/15:40', place: port('covering_board') },
  {
    of: 'beamRot',
    with: 'wes/-57/15:40',
    finding: 'beamFour',
    set: 'before',
    place: starboard('deck_beam', { number: 4 }),
  },
  {
    of: 'beamSpliced',
    with: 'hob/-54/15:30',
    finding: 'beamFour',
    set: 'after',
    place: starboard('deck_beam', { number: 4 }),
  },
  {
    of: 'widderBeams',
    with: 'hob/-54/15:30',
    set: 'before-closing',
    place: { partId: 'deck_beam', side: 'both' },
  },
  { of: 'deckDry', with: 'tamsin/-44/15:55', place: { partId: 'aft_deck' } },
  {
    of: 'cleatStain',
    with: 'tamsin/-31/15:45',
    finding: 'cleatRing',
    set: 'before',
    place: centre('foredeck'),
  },
  { of: 'bleached', with: 'tamsin/-25/15:40', finding: 'cleatRing', set: 'after', place: centre('foredeck') },
  { of: 'bleachedNear', with: 'tamsin/-21/15:50', place: { partId: 'deck_seam' } },
  { of: 'stains', with: 'tamsin/-20/14:30', caption: 'Bare, one, two' },
  { of: 'stainedDeck', with: 'tamsin/-18/15:40', place: { partId: 'deck' } },
  { of: 'raked', with: 'lenny/-11/15:25', place: { partId: 'deck_seam', side: 'both' } },
  { of: 'coatFour', with: 'tamsin/-8/15:10', place: { partId: 'aft_deck' } },
  { of: 'transomCoat', with: 'tamsin/-6/14:30', place: centre('transom') },
  { of: 'hatchesCoat', with: 'tamsin/-5/15:40', place: { partId: 'engine_hatch' } },
  {
    of: 'taped',
    with: 'lenny/-3/15:20',
    place: { partId: 'deck_seam', words: 'test length, forward of the windshield' },
  },
  { of: 'bloom', with: 'tamsin/-2/15:30', finding: 'bloom', place: { partId: 'foredeck', side: 'both' } },
  { of: 'coatSeven', with: 'tamsin/-1/15:15', place: { partId: 'foredeck', side: 'both' } },
];

const HICKORY: DemoPhoto[] = [
  { of: 'hickoryPort', with: 'hob/-28/15:40', set: 'arrival', place: port('topsides') },
  { of: 'hickoryStarboard', with: 'hob/-28/15:40', set: 'arrival', place: starboard('topsides') },
  {
    of: 'hickoryPaint',
    with: 'hob/-28/15:40',
    finding: 'lead',
    set: 'arrival',
    place: port('topsides', { words: 'quarter' }),
  },
  { of: 'hickoryInside', with: 'hob/-28/15:40', set: 'arrival', place: { partId: 'bent_rib', side: 'port' } },
  {
    of: 'oldName',
    with: 'hob/-18/15:30',
    finding: 'oldName',
    set: 'mark',
    place: centre('transom'),
    caption: 'Left as it is',
  },
  { of: 'lapsBare', with: 'hob/-14/15:40', set: 'after', place: port('lap', { number: 2, toNumber: 5 }) },
  { of: 'turned', with: 'hob/-14/15:40', place: starboard('bottom') },
  {
    of: 'ribNine',
    with: 'hob/-13/15:50',
    finding: 'ribNine',
    set: 'before',
    place: port('bent_rib', { number: 9 }),
  },
  {
    of: 'ribSistered',
    with: 'hob/-12/16:00',
    finding: 'ribNine',
    set: 'after',
    place: port('bent_rib', { number: 9 }),
  },
  { of: 'stemRabbet', with: 'hob/-7/15:50', finding: 'stemRot', set: 'before', place: centre('stem') },
  { of: 'stemPiece', with: 'graving', finding: 'stemRot', place: centre('stem') },
  { of: 'keelBolts', with: 'hob/-4/15:40', finding: 'keelBolts', set: 'before', place: centre('bolt_keel') },
  { of: 'bolts', with: 'hob/-3/15:50', finding: 'keelBolts', place: centre('bolt_keel') },
  { of: 'boltsOut', with: 'hob/-1/11:40', finding: 'keelBolts' },
  { of: 'lapsMissing', with: 'lapFour', finding: 'rivets' },
];

export const DEMO_PHOTOS: DemoPhoto[] = [...WIDDER, ...PENNY, ...HICKORY];
