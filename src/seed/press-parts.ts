import { type PartKind } from '../domain/part-kinds.ts';

type Row = readonly [
  number: string,
  name: string,
  kind: PartKind,
  quantity: number,
  material: string,
  size: string,
  aliases?: string,
];

/** The parts list of the demo's press, as its plans' revision B has it; 125 came at the bench. */
export const PRESS_PARTS: readonly Row[] = [
  ['101', 'base rail', 'made', 2, '100 x 50 x 4 box', '900 mm'],
  ['102', 'upright', 'made', 2, '80 x 80 x 5 box', '1450 mm'],
  ['103', 'head beam', 'made', 1, '120 x 60 channel, two back to back', '780 mm'],
  ['104', 'gusset', 'made', 8, '8 mm plate', '120 x 120 mm'],
  ['105', 'foot', 'made', 4, '10 mm plate', '120 x 80 mm'],
  ['106', 'platen', 'made', 1, '20 mm plate', '420 x 420 mm'],
  ['107', 'platen guide', 'made', 2, '50 x 10 flat', '576 mm'],
  ['108', 'rack slat', 'made', 60, 'ash, untreated', '36 x 8 x 460 mm'],
  ['109', 'rack frame', 'made', 6, 'ash, untreated', '470 x 470 mm, slats 12 mm apart'],
  ['110', 'press cloth', 'bought', 6, 'polyester, food grade', '900 x 900 mm'],
  ['111', 'hopper', 'made', 1, '1.5 mm stainless', '400 x 400 mm top'],
  ['112', 'hopper flange', 'made', 1, '3 mm stainless', '180 x 180 mm'],
  ['113', 'mill frame', 'made', 1, '40 x 40 x 3 box', '640 mm'],
  ['114', 'side plate', 'made', 2, '10 mm plate', '260 x 220 mm'],
  ['115', 'stator comb', 'made', 1, '6 mm stainless', '198 mm', 'comb'],
  ['116', 'comb adjuster', 'made', 2, 'M10 screw and block', '60 mm'],
  ['117', 'drum shaft', 'made', 1, '40 mm bright bar', '412 mm'],
  ['118', 'bearing housing', 'made', 2, '100 x 20 flat', '140 mm'],
  ['119', 'ball bearing', 'bought', 2, '6207, sealed', '35 x 72 x 17 mm', 'bearing'],
  ['120', 'drum', 'made', 1, 'maple, turned', '160 mm, 196 mm long'],
  ['121', 'drum blade', 'made', 8, '2 mm stainless', '194 mm'],
  ['122', 'pulley', 'bought', 1, 'cast, two groove', '200 mm'],
  ['123', 'belt guard', 'made', 1, '1.5 mm sheet', '480 x 260 mm'],
  ['124', 'cylinder', 'bought', 1, '100 mm bore, 45 mm rod', '600 mm stroke', 'ram'],
  ['125', 'port adapter', 'bought', 2, 'steel', 'G 3/8 to 3/8 NPT'],
  ['126', 'pump', 'bought', 1, 'two stage', ''],
  ['127', 'relief valve', 'bought', 1, '', 'set at 110 bar'],
  ['128', 'oil tank', 'made', 1, '3 mm plate', '40 litres', 'reservoir'],
  ['129', 'pressure gauge', 'bought', 1, 'glycerine filled', '0 to 250 bar'],
  ['130', 'motor', 'bought', 1, '1.5 kW, single phase', '1400 rpm'],
  ['131', 'drip tray', 'made', 1, '1.5 mm stainless on 20 mm plate', '560 x 560 mm, 10 mm fall'],
  ['132', 'spout', 'made', 1, 'stainless tube', '38.1 mm'],
  ['133', 'wheel', 'bought', 2, 'rubber tyre', '260 mm'],
  ['134', 'push handle', 'salvaged', 1, 'tube', '30 mm'],
];

/** Parts that the plans do not have yet. */
export const NOT_IN_PLANS: readonly string[] = ['125'];

/** The stages of the build, in order. */
export const PRESS_STAGES: readonly (readonly [name: string, about: string])[] = [
  ['Frame', 'Rails, uprights and head beam, tacked square and welded.'],
  ['Racks and cloths', 'Slats and frames that hold the pomace while it is pressed.'],
  ['Drum and bearings', 'The mill drum, its shaft and what it runs in.'],
  ['Mill', 'Hopper, comb and guard round the drum.'],
  ['Hydraulics', 'Cylinder, pump, relief valve and tank.'],
  ['First pressing', 'Everything together, with guards on, and a barrow of apples.'],
];
