/** Whether a part comes in pairs, lies on the centreline, or may be on any side. */
export type Sidedness = 'sided' | 'centre' | 'either' | 'whole';

/** A part of a boat as it is looked up and named. */
export interface Part {
  id: string;
  word: string;
  region: string;
  sides: Sidedness;
  /** counted along the boat: beam 4, frame 7 */
  isNumbered: boolean;
  /** other words that people look for it by */
  also: string[];
}

// id | word | region | sides | numbered | also
const TABLE = `
whole_boat|whole boat|whole|whole||hull and all
hull|hull|whole|whole||outside, hull shell, bare hull, hull outside
deck|deck|deck|either||topdeck, all the deck, topside deck
foredeck|foredeck|deck|either||forward deck, front deck, bow deck
side_deck|side deck|deck|sided||walkway, waist deck, starboard side deck
aft_deck|aft deck|deck|either||back deck, stern deck, half deck
deck_plank|deck plank|deck|sided|numbered|deck strake, deck boards, strip of decking
king_plank|king plank|deck|centre||centre plank, center plank, king board
covering_board|covering board|deck|sided||plank sheer, coverboard, outer deck plank
margin_plank|margin plank|deck|sided||margin board, margin piece, border plank
deck_seam|deck seam|deck|either||white seams, caulk lines, foredeck seams
deck_canvas|deck canvas|deck|either||deck cloth, canvas on deck, painted canvas
deck_panel|deck panel|deck|either||deck sheet, plywood deck, foredeck panel
subdeck|subdeck|deck|either||sub deck, under deck, plywood underneath
toe_rail|toe rail|deck|sided||foot rail, toe strip
coaming|cockpit coaming|deck|sided||coaming board, coaming cap, cockpit side board
crash_pad|crash pad|deck|either||cockpit pad, coaming pad, dash pad
engine_hatch|engine hatch|deck|either||engine box lid, motor hatch, hatch cover
hatch_frame|hatch frame|deck|either||hatch framing, hatch underframe, hatch opening
hatch_gutter|hatch gutter|deck|either||hatch drain, hatch trough, drain channel
fore_hatch|fore hatch|deck|centre||bow hatch, deck hatch, anchor hatch
cabin_side|cabin side|deck|sided||cabin trunk side, house side, deckhouse side
cabin_top|cabin top|deck|either||coach roof, house top, hardtop
topsides|topsides|topsides|sided||hull side, hull side planking, her sides
side_plank|side plank|topsides|sided|numbered|hull plank, topside plank, strake
sheer_plank|sheer plank|topsides|sided||sheer strake, top plank, uppermost plank
transom|transom|topsides|either||stern, stern, transom face, stern board
transom_plank|transom plank|topsides|either|numbered|transom board, transom plank ends, transom face boards
topside_seam|side seam|topsides|sided||topside seam, hull seam, plank seam
lap|plank lap|topsides|sided|numbered|land, overlap, lap joint
gunwale|gunwale|topsides|sided||gunnel, rail cap, top rail
inwale|inwale|topsides|sided||inner gunwale, inner rail, inner gunnel
rub_rail|rub rail|topsides|sided||rubbing strake, guard, rubbing strip
spray_rail|spray rail|topsides|sided||spray strip, knocker, spray deflector
boot_top|boot top|topsides|sided||boot stripe, waterline stripe, boot striping
name_lettering|name lettering|topsides|either||painted name, gold leaf, name board
registration_lettering|registration lettering|topsides|sided||registration numbers, bow numbers, registration letters
waterline|waterline|topsides|either||water line, load waterline, scribed line
bottom|bottom|bottom|either||below the waterline, underside, underneath the boat
bottom_plank|bottom plank|bottom|sided|numbered|outer bottom planks, outer layer, outside bottom planks
garboard|garboard|bottom|sided||garboard strake, garboard plank, first bottom plank
broad_strake|broad strake|bottom|sided||broad plank, second strake, second plank out
inner_bottom|inner bottom|bottom|either||inner planking, inner skin, inner layer
bottom_membrane|cloth between layers|bottom|either||canvas between, bottom canvas, membrane
bottom_seam|bottom seam|bottom|sided||garboard seam, bottom plank seam, keel seam
chine|chine|bottom|sided||chine log, chine piece, chine timber
keel|keel|bottom|centre||keel timber, main keel, keel plank
false_keel|false keel|bottom|centre||worm shoe, keel strip, keel band
forefoot|forefoot|bottom|centre||fore foot, gripe, forefoot plank
skeg|skeg|bottom|centre||skeg fin, keel fin, little keel aft
deadwood|deadwood|bottom|centre||dead wood, stern deadwood, aft deadwood
stem|stem|framing|centre||stem post, bow stem, stem piece
knee|knee|framing|either||transom knee, stern knee, hanging knee
stem_knee|stem knee|framing|centre||stem gusset, stem brace, bow knee
breasthook|breasthook|framing|centre||breast hook, bow hook, bow knee across
keelson|keelson|framing|centre||kelson, kelson, inner keel, inside keel
frame|frame|framing|either|numbered|bottom frame, side frame, main frame
bent_rib|steam-bent rib|framing|either|numbered|bent frame, steamed frame, timber
futtock|futtock|framing|sided||futtock joint, side futtock, upper futtock
floor_timber|floor timber|framing|either|numbered|floor frame, bottom cross member, floor arm
gusset|gusset|framing|sided||chine gusset, frame gusset, cheek
seam_batten|seam batten|framing|sided|numbered|backing batten, bottom batten, side batten
stringer|stringer|framing|sided||bilge stringer, main stringer, side stringer
engine_bed|engine bed|framing|sided||engine bearers, engine stringers, motor beds
deck_beam|deck beam|framing|either|numbered|cross beam, deck beam end, deck frame
carlin|carlin|framing|sided||deck carlin, cockpit carlin, hatch carlin
sheer_clamp|sheer clamp|framing|sided||clamp timber, clamp and shelf, sheer log
shelf|shelf|framing|sided||beam shelf, deck shelf, beam shelves
transom_frame|transom frame|framing|either||transom framing, transom bow, transom cheek
bulkhead|bulkhead|framing|either||firewall, bulkhead forward, aft bulkhead
butt_block|butt block|framing|either||backing block, plank butt, butt joint block
mast_step|mast step|framing|centre||step block
thwart|thwart|interior|either|numbered|rowing seat, middle thwart, center thwart
cockpit_sole|cockpit sole|interior|either||floorboards, floor boards, sole panel
ceiling|ceiling planking|interior|sided||ceiling planks, inside planking, side ceiling
seat_frame|seat frame|interior|either||seat base, front seat, rear seat
upholstery|upholstery|interior|either||cushions, seat covers, vinyl
dashboard|dashboard|interior|either||instrument panel, gauge panel, dash board
cabinetry|joinery and lockers|interior|either||berth, galley, cabinet
companionway|companionway|interior|either||companion way, cabin door, steps
bilge|bilge|interior|either||inside bottom, bilge area, in the bilge
limber_hole|limber hole|interior|either||frame limbers, drain hole, weep hole
engine|engine|machinery|either||motor, block, straight six
carburetor|carburettor|machinery|either||carburetor, carbs, carby
manifold|manifold|machinery|either||exhaust manifold, intake manifold, water jacket
exhaust|exhaust|machinery|either||exhaust hose, muffler, riser
transmission|gearbox|machinery|either||transmission, reverse gear, tranny
shaft|propeller shaft|machinery|either||prop shaft end, tail shaft, shaft taper
shaft_log|shaft log|machinery|centre||stern tube, shaft hole, shaft alley
stuffing_box|stuffing box|machinery|centre||packing gland, shaft gland, stern gland
strut|strut|machinery|either||shaft strut, p bracket, strut bearing
propeller|propeller|machinery|either||prop, wheel, props, prop nut
rudder|rudder|machinery|either||rudder blade, rudder stock, rudder shaft
rudder_port|rudder port|machinery|either||rudder tube, rudder stuffing box, rudder gland
steering_gear|steering gear|machinery|either||steering box, tiller arm, steering cable
fuel_tank|fuel tank|machinery|either||gas tank, gas tanks, petrol tank, tank strap
fuel_line|fuel line|machinery|either||fuel hose, fill hose, vent hose
water_pump|water pump|machinery|either||raw water pump, impeller pump, cooling pump
bilge_pump|bilge pump|machinery|either||float switch, auto bilge pump, hand pump
bilge_blower|bilge blower|machinery|either||engine blower, engine room blower, blower hose
thru_hull|through-hull fitting|machinery|either||thru hull, seacock, sea cock
wiring|wiring|machinery|either||harness, wires, wire loom
battery|battery|machinery|either||batteries, battery box, battery tray
gauges|gauges|hardware|either||instruments, tach, oil gauge
windshield|windshield|hardware|either||windscreen, glass, windshield frame
windshield_bracket|windshield bracket|hardware|sided||stanchion, windshield foot, windshield feet
cutwater|cutwater|hardware|centre||bow iron, stem band, cut-water
rub_rail_cap|metal rub rail cap|hardware|sided||rub rail stainless, half round, half oval
cleat|cleat|hardware|either||bow cleat, stern cleat, mooring cleat
chock|chock|hardware|either||bow chocks, stern chock, fairlead
lifting_ring|lifting ring|hardware|either||lifting eye, hoisting ring, pick point
bow_eye|bow eye|hardware|centre||winch eye, trailer eye, towing eye
navigation_light|navigation light|hardware|either||bow light, stern light, running lights
vent|vent|hardware|either||cowl vent, clamshell, air vent
hinge|hinge|hardware|either||piano hinge, hatch hinges, engine hatch hinge
step_pad|step pad|hardware|either||boarding step, step plate, tread
port_light|port light|hardware|sided||cabin window, opening port, fixed port
steering_wheel|steering wheel|hardware|either||helm, banjo wheel, wheel rim
hardware_all|deck hardware|hardware|either||brightwork metal, fittings, chrome
bungs|bungs|deck|either||plugs, wood plugs, deck plugs
fastenings|fastenings|whole|either||fasteners, screws, bolts
bolt_keel|keel bolts|bottom|centre||drift, drift pin, floor bolt
spar|spar|deck|whole||mast, boom, gaff
centerboard|centreboard|bottom|centre||centerboard, daggerboard, board
centerboard_trunk|centreboard case|interior|centre||trunk, centerboard trunk, center board trunk
trailer|trailer|hardware|either||trailer bunks, trailer rollers, trailer winch
flag_staff|flag staff|hardware|either||flag pole, flag pole socket, ensign staff
`;

/** The parts of the trade's vocabulary. A screen that needs none of it loads none of it. */
export const PARTS: readonly Part[] = TABLE.trim().split('\n').map(readPart);

function readPart(line: string): Part {
  const [id, word, region, sides, numbered, also] = line.split('|') as [
    string,
    string,
    string,
    Sidedness,
    string,
    string,
  ];
  return { id, word, region, sides, isNumbered: numbered !== '', also: also === '' ? [] : also.split(', ') };
}
