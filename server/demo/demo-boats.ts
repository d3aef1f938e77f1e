import type { BoatKey, DemoBoat } from './demo-work.ts';

const FT_MM = 304.8;
const feet = (count: number) => Math.round(count * FT_MM);

const PENNY: DemoBoat = {
  particulars: {
    name: 'Penny Candle',
    type: 'launch, carvel',
    lengthMm: feet(26),
    beamMm: feet(7),
    hullNumber: '26-117',
    builder: 'Quillon and Daughters, Saltmarsh',
    builtYear: 1934,
    numbering: 'frames and floors from the stem, planks from the keel',
  },
  listed: [-56, '07:10'],
  template: 'varnished_planked',
  counts: { places: { raise_dents_wet_cloth_cloth: [{ words: 'foredeck', partId: 'foredeck' }] } },
  chosen: [],
  reckoned: {
    arrive: 2,
    strip_out: 3,
    strip_finish: 2.5,
    survey_open: 2.5,
    frame_repair: 1.5,
    topsides: 1.5,
  },
  owner: 'ottilie',
  before: [],
  done: {
    arrive: { from: -56, to: -53, by: ['rosa', 'wes'] },
    strip_out: { from: -52, to: -40, by: ['wes', 'rosa'] },
    strip_finish: { from: -37, to: -22, by: ['wes', 'rosa', 'wes'] },
    survey_open: { from: -19, to: -13, by: ['rosa', 'wes'], left: ['owner_decision_each_item'] },
  },
  doing: {
    name_old_species_before_choosing: { ticked: [['wes', -10, '15:41']] },
    splice_scarf_beams_clamps_stringers: { ticked: [['rosa', -6, '15:52']] },
    repair_sister_frames_floor_timbers: { started: ['wes', -11, '07:50'], assignees: ['rosa', 'wes'] },
    check_hull_fair_true_after: { started: ['wes', -14, '15:51'] },
    preserve_seal_prime_new_wood: { started: ['rosa', -3, '10:20'] },
    graving_pieces_stem_keel: {},
    refasten_planks_samples_failed: { assignees: ['wes'] },
  },
  own: {
    survey_open: [
      {
        title: 'Lift the port sole panels',
        estimateHours: 8,
        place: { partId: 'cockpit_sole', side: 'port' },
        ticked: [['rosa', -20, '11:50']],
      },
      {
        title: 'Look at floor 7 starboard, mirror first',
        estimateHours: 1,
        place: { partId: 'floor_timber', side: 'starboard', number: 7 },
        added: -19,
        ticked: [['wes', -17, '10:10']],
      },
      { title: 'Sketch of what is soft, with sizes', estimateHours: 3, ticked: [['rosa', -14, '15:20']] },
    ],
    frame_repair: [
      {
        title: 'Cut the rot out of floor 7, port',
        estimateHours: 6,
        place: { partId: 'floor_timber', side: 'port', number: 7 },
        finding: 'floorPort',
        added: -13,
        ticked: [['rosa', -12, '15:55']],
      },
      {
        title: 'Scarf the port bilge stringer',
        estimateHours: 10,
        place: { partId: 'stringer', side: 'port' },
        finding: 'stringerPort',
        added: -13,
        ticked: [['rosa', -7, '15:45']],
      },
      {
        title: 'Splice floor 7, starboard',
        estimateHours: 8,
        place: { partId: 'floor_timber', side: 'starboard', number: 7 },
        finding: 'floorStarboard',
        added: -13,
        ticked: [['wes', -9, '15:30']],
      },
      {
        title: 'Sister frames 8 and 9, port',
        estimateHours: 9,
        place: { partId: 'frame', side: 'port', number: 8, toNumber: 9 },
        finding: 'ribPort',
        added: -8,
        ticked: [
          ['wes', -4, '15:50'],
          ['rosa', -4, '15:52'],
        ],
      },
      {
        title: 'Prime the bilge, frames 4 to 10',
        estimateHours: 6,
        place: { partId: 'bilge', number: 4, toNumber: 10 },
        added: -4,
        assignees: ['wes'],
        planned: 0,
        started: ['wes', -1, '13:05'],
      },
      {
        title: 'Steam two new ribs, 11 and 12',
        estimateHours: 7,
        place: { partId: 'frame', side: 'starboard', number: 11, toNumber: 12 },
        added: -4,
        assignees: ['rosa', 'wes'],
        planned: 1,
      },
      { title: 'Photographs before the sole goes back', estimateHours: 1, assignees: ['rosa'], planned: 0 },
    ],
    topsides: [
      {
        title: 'Dutchman in plank 5, port, at the quarter',
        estimateHours: 4,
        place: { partId: 'side_plank', side: 'port', number: 5 },
        finding: 'splitFive',
        added: -22,
      },
    ],
    machinery: [
      {
        title: 'Engine bed painted',
        estimateHours: 3,
        place: { partId: 'engine_bed' },
        assignees: ['wes'],
        planned: 1,
      },
    ],
  },
};

const WIDDER: DemoBoat = {
  particulars: {
    name: 'Widdershins',
    type: 'utility',
    lengthMm: feet(24),
    beamMm: feet(7.5),
    hullNumber: 'W 24 09',
    builder: 'Pargeter Boat Works, Loon Bend',
    builtYear: 1951,
    numbering: 'deck planks from the king plank, outboard',
  },
  arrivedDaysAgo: 162,
  listed: [-65, '16:30'],
  template: 'varnished_planked',
  counts: {
    places: {
      raise_dents_wet_cloth_cloth: [{ words: 'topsides', partId: 'topsides' }],
      last_dents_raised_wet_cloth: [{ words: 'foredeck', partId: 'foredeck' }],
    },
  },
  chosen: ['bleach'],
  reckoned: { topsides: 2, deck: 3.5, fair: 2, bleach: 4, stain: 1.5, varnish: 2 },
  owner: 'tamsin',
  before: ['arrive', 'strip_out', 'strip_finish', 'survey_open', 'frame_repair'],
  done: {
    topsides: { from: -63, to: -57, by: ['rosa', 'hob', 'tamsin', 'lenny'] },
    deck: { from: -59, to: -38, by: ['rosa', 'hob', 'tamsin'] },
    fair: { from: -37, to: -30, by: ['hob', 'tamsin'] },
    bleach: { from: -29, to: -21, by: ['tamsin'] },
    stain: { from: -20, to: -16, by: ['tamsin'] },
  },
  doing: {
    build_coats_1_4_rub: { ticked: [['tamsin', -8, '15:10']] },
    build_coats_5_8: { started: ['tamsin', -7, '09:20'], assignees: ['tamsin'], planned: 0 },
    clean_mask_seams: { started: ['lenny', -17, '08:05'] },
    prime_seams_if_asked: { assignees: ['lenny'] },
    fault_correction: { ticked: [['tamsin', -2, '15:30']] },
  },
  own: {
    varnish: [
      {
        title: 'Hatches, both sides, six coats',
        estimateHours: 14,
        place: { partId: 'engine_hatch' },
        assignees: ['tamsin'],
        planned: 1,
        started: ['tamsin', -5, '08:10'],
      },
    ],
    pay_seams: [
      {
        title: 'Rake and clean the seams',
        estimateHours: 8,
        place: { partId: 'deck_seam' },
        ticked: [['lenny', -11, '15:25']],
      },
    ],
    refit_hardware: [
      {
        title: 'Bed the windshield feet',
        estimateHours: 4,
        place: { partId: 'windshield_bracket', side: 'both' },
      },
    ],
  },
};

const HICKORY: DemoBoat = {
  particulars: {
    name: 'Hickory Moon',
    type: 'skiff, lapstrake, painted',
    lengthMm: feet(19),
    beamMm: feet(5.5),
    hullNumber: 'none found',
    builtYear: 1948,
    numbering: 'ribs from the stem, planks from the keel, and so when she is turned',
  },
  listed: [-29, '07:10'],
  template: 'painted_lapstrake',
  counts: {
    ribs: [
      { number: 11, side: 'starboard' },
      { number: 12, side: 'starboard' },
    ],
    places: { dutchman_scarf_split: [{ partId: 'lap', side: 'port', number: 6, words: 'lap' }] },
  },
  chosen: ['turn_over'],
  reckoned: { arrive: 2, strip_paint: 2, ribs: 2 },
  owner: 'castor',
  before: [],
  done: {
    arrive: { from: -29, to: -27, by: ['hob', 'lenny'] },
    strip_paint: { from: -24, to: -14, by: ['hob', 'lenny'], left: ['clean_lap_edges_hook_do'] },
    survey_open: { from: -13, to: -12, by: ['hob'] },
  },
  doing: {
    clean_lap_edges_hook_do: { started: ['lenny', -5, '08:00'] },
    turn_boat_over_shop_does: { ticked: [['hob', -14, '11:20']] },
    'steam_fit_ribs_each/11': { ticked: [['hob', -8, '15:31']] },
    'rivet_ribs_each/11': { ticked: [['hob', -8, '15:32']] },
    'steam_fit_ribs_each/12': { assignees: ['hob'], planned: 1 },
    stem_rabbet_graving_pieces: {
      ticked: [
        ['hob', -6, '15:20'],
        ['wes', -6, '15:58'],
      ],
    },
    check_shape_after_each_few: { started: ['hob', -8, '15:33'] },
    clean_prime_laps: { started: ['lenny', -2, '08:00'], assignees: ['lenny'], planned: 0 },
    centreboard_case_pin: { struck: 'no board in her' },
    spars_sanded_coated: { struck: 'she is rowed' },
    seal_lap_edges_as_built: { started: ['lenny', -1, '08:10'], assignees: ['lenny'] },
  },
  own: {
    ribs: [
      {
        title: 'Sister rib 9, port',
        estimateHours: 4,
        place: { partId: 'bent_rib', side: 'port', number: 9 },
        finding: 'ribNine',
        added: -13,
        ticked: [['hob', -12, '16:00']],
      },
      {
        title: 'Keel bolts out and looked at',
        estimateHours: 5,
        place: { partId: 'bolt_keel', side: 'centre' },
        added: -5,
        assignees: ['hob'],
        planned: 0,
        started: ['hob', -1, '07:45'],
      },
    ],
    lap_bed: [
      {
        title: 'Clean laps 3 and 4, port',
        estimateHours: 4,
        place: { partId: 'lap', side: 'port', number: 3, toNumber: 4 },
        assignees: ['lenny'],
        ticked: [['lenny', -2, '14:45']],
      },
      {
        title: 'Missing rivets, port, ribs 5 to 8',
        estimateHours: 3,
        place: { partId: 'lap', side: 'port' },
        finding: 'rivets',
        added: -1,
        assignees: ['lenny'],
        planned: 1,
      },
    ],
  },
  lies: { way: 'upside-down', since: -14 },
};

export const DEMO_BOATS: Record<BoatKey, DemoBoat> = { penny: PENNY, widder: WIDDER, hickory: HICKORY };
