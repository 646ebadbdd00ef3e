import { type NoteAudience, type NoteKind, type SizeStanding } from '../domain/note-kinds.ts';

export interface DemoNote {
  /** Seconds into the episode. */
  readonly at: number;
  readonly kind: NoteKind;
  /** Empty for the usual caution of a topic in its own words. */
  readonly text: string;
  readonly parts: readonly string[];
  readonly standing?: SizeStanding;
  readonly topic?: string;
  /** Viewers when left out. A person who is asked is the owner. */
  readonly audience?: NoteAudience;
}

/** A video elsewhere with its length as a person types it, or a file of src/seed/media with its captions. */
export type DemoVideo =
  | { readonly address: string; readonly length: string }
  | { readonly file: string; readonly captions: string };

export interface DemoEpisode {
  readonly number: number;
  readonly title: string;
  readonly about: string;
  readonly video: DemoVideo;
  readonly chapters: readonly (readonly [at: number, title: string])[];
  readonly notes: readonly DemoNote[];
  /** Parts in view for longer than their notes say. */
  readonly onBench: readonly (readonly [part: string, from: number, to: number])[];
}

export interface PublishedEpisode extends DemoEpisode {
  readonly publishedOn: string;
}

/** The demo's episodes that are out. Their seconds are those of the narration in src/seed/media. */
export const PRESS_EPISODES: readonly PublishedEpisode[] = [
  {
    number: 1,
    title: 'Square tubes and a square frame',
    about:
      'What the frame has to hold, two rails cut as one, and four corners pulled square before they are welded.',
    publishedOn: '2026-10-01',
    video: { file: 'press-1.mp4', captions: 'press-1.vtt' },
    chapters: [
      [0, 'What it has to hold'],
      [20, 'Cutting the rails'],
      [37, 'Tacking it square'],
    ],
    notes: [
      {
        at: 9.4,
        kind: 'rating',
        text: 'The cylinder, 100 mm bore, pushes 86 kN at 110 bar: near enough 9 tonnes.',
        parts: ['124'],
      },
      { at: 12.4, kind: 'caution', topic: 'pressure', text: '', parts: ['124'] },
      {
        at: 15.3,
        kind: 'caution',
        topic: 'load',
        text: 'All of that pulls on the frame. This is how mine is made, not a design for yours: have a licensed person check the frame before it is loaded.',
        parts: ['101', '102', '103'],
      },
      {
        at: 25.6,
        kind: 'size',
        standing: 'plan',
        text: 'Base rails are 900 mm, from 100 x 50 x 4 box, both cut in one clamping.',
        parts: ['101'],
      },
      {
        at: 30.7,
        kind: 'size',
        standing: 'plan',
        text: 'Uprights are 1450 mm, from 80 x 80 x 5 box.',
        parts: ['102'],
      },
      {
        at: 37.5,
        kind: 'step',
        text: 'Uprights stand on the rails, over both of them, not beside them. The rails lie 40 mm apart.',
        parts: ['102', '101'],
      },
      {
        at: 42,
        kind: 'tip',
        text: 'Tack it, measure both diagonals, pull it in, and only then weld.',
        parts: [],
      },
      {
        at: 45.2,
        kind: 'size',
        standing: 'as-made',
        text: 'Diagonals came out at 1627 mm and 1629 mm, over the outer corners of the uprights. On paper both are 1628 mm.',
        parts: ['102'],
      },
      {
        at: 52.4,
        kind: 'step',
        text: 'One clamp across the long diagonal. It stays on until the welds are cold.',
        parts: ['102'],
      },
      {
        at: 56.6,
        kind: 'setting',
        text: 'Gussets to base rail: E7018, 3.2 mm rods, 115 A.',
        parts: ['104', '101'],
      },
      {
        at: 64.8,
        kind: 'caution',
        topic: 'fumes',
        text: 'Weld with the doors open and the fan behind you. Keep your head out of the smoke.',
        parts: [],
      },
      { at: 67.8, kind: 'caution', topic: 'arc', text: '', parts: [] },
    ],
    onBench: [
      ['101', 0.8, 8.9],
      ['102', 0.8, 8.9],
      ['103', 0.8, 8.9],
      ['124', 5.4, 19.5],
      ['106', 5.4, 19.5],
      ['101', 20, 30.2],
      ['102', 30.5, 56],
      ['104', 56.6, 71.5],
    ],
  },
  {
    number: 2,
    title: 'Sixty slats and six racks',
    about: 'An afternoon of one cut, sixty-four times over, and six racks that come apart to be washed.',
    publishedOn: '2026-10-15',
    video: { address: 'https://video.example/marram-lane/press-2', length: '9:05' },
    chapters: [
      [0, 'Why ash'],
      [70, 'A jig for the slats'],
      [330, 'Racks together'],
    ],
    notes: [
      {
        at: 84,
        kind: 'size',
        standing: 'plan',
        text: 'Slats 36 x 8 x 460 mm, sixty of them and four spare: ten a rack, 12 mm apart.',
        parts: ['108', '109'],
      },
      {
        at: 150,
        kind: 'caution',
        topic: 'dust',
        text: 'Ash dust is bad for the lungs. Extraction on, mask on.',
        parts: ['108'],
      },
      {
        at: 345,
        kind: 'step',
        text: 'Rack frames are pegged, not glued: glue and juice do not go together.',
        parts: ['109', '108'],
      },
      { at: 352, kind: 'caution', topic: 'food', text: '', parts: ['109'] },
      {
        at: 410,
        kind: 'size',
        standing: 'as-made',
        text: 'All six rack frames are 470 x 470 mm, give or take 1 mm. They need not match: they only have to lie flat.',
        parts: ['109'],
      },
      {
        at: 470,
        kind: 'undecided',
        text: 'Press cloths with or without a hem. I will press once with each.',
        parts: ['110'],
      },
    ],
    onBench: [
      ['108', 70, 330],
      ['109', 330, 520],
    ],
  },
  {
    number: 3,
    title: 'Turning the drum',
    about:
      'A maple drum turned on its own shaft, a little over size, and eight blades that know their slots.',
    publishedOn: '2026-10-29',
    video: { file: 'press-3.mp4', captions: 'press-3.vtt' },
    chapters: [
      [0, 'The blank'],
      [17.5, 'Roughing and truing'],
      [36.1, 'Blades'],
    ],
    notes: [
      {
        at: 0.8,
        kind: 'step',
        text: 'Dry maple without knots, turned on the shaft that it will run on.',
        parts: ['120'],
      },
      { at: 6.6, kind: 'size', standing: 'plan', text: 'The drum is 196 mm long.', parts: ['120'] },
      {
        at: 13.2,
        kind: 'caution',
        topic: 'food',
        text: 'Juice runs over the drum: no glue, no stain, no varnish.',
        parts: ['120'],
      },
      { at: 17.9, kind: 'setting', text: 'Roughing at 350 rpm, finishing at 700 rpm.', parts: ['120'] },
      {
        at: 22.9,
        kind: 'caution',
        topic: 'rotating',
        text: 'No gloves and no sleeves near the drum. Stop it before you measure.',
        parts: ['120'],
      },
      {
        at: 27.3,
        kind: 'size',
        standing: 'as-made',
        text: 'The drum came out at 160.4 mm across. The plan says 160 mm.',
        parts: ['120'],
      },
      {
        at: 31.5,
        kind: 'step',
        text: 'Left as it is: the stator comb adjusts for more than that.',
        parts: ['115'],
      },
      {
        at: 36.5,
        kind: 'size',
        standing: 'plan',
        text: 'Eight drum blades of 2 mm stainless, 194 mm long, one every 45°.',
        parts: ['121'],
      },
      {
        at: 43.8,
        kind: 'tip',
        text: 'Number blades and slots with a paint pen before you take them out again.',
        parts: ['121'],
      },
      {
        at: 48.4,
        kind: 'undecided',
        text: 'How far the drum blades stand out: two or three millimetres. A bucket of apples with each, then I decide.',
        parts: ['121'],
      },
    ],
    onBench: [
      ['120', 0.8, 36],
      ['117', 6.6, 17.4],
      ['121', 36.3, 57],
    ],
  },
  {
    number: 4,
    title: 'The drum shaft, its bearings and the wrong port thread',
    about:
      'A shaft to a thousandth, two bearings that go on by the right ring, and a cylinder whose ports are not those of the plans.',
    publishedOn: '2026-11-12',
    video: { file: 'press-4.mp4', captions: 'press-4.vtt' },
    chapters: [
      [0, 'Drum shaft'],
      [23.7, 'Bearing housings'],
      [45.4, 'Cylinder and ports'],
      [81.1, 'Platen and drip tray'],
    ],
    notes: [
      {
        at: 6.3,
        kind: 'step',
        text: 'Face and centre the drum shaft, 412 mm, from 40 mm bright bar.',
        parts: ['117'],
      },
      {
        at: 19,
        kind: 'size',
        standing: 'as-made',
        text: 'Bearing seats came out at 35.009 mm. The plan says 35 k6: 35.002 to 35.018 mm. Inside.',
        parts: ['117', '119'],
      },
      { at: 24.2, kind: 'step', text: 'A sealed 6207 in each bearing housing.', parts: ['118', '119'] },
      {
        at: 30.4,
        kind: 'tip',
        text: 'Press a ball bearing on by its inner ring. Through the balls, you mark the races.',
        parts: ['119'],
      },
      {
        at: 35.1,
        kind: 'step',
        text: 'Bearing housings go on through slotted feet, so the drum can be squared up before the bolts are nipped.',
        parts: ['118', '120'],
      },
      {
        at: 40.1,
        kind: 'caution',
        topic: 'rotating',
        text: 'Guard the drum before it turns under power. Lock out the motor to clear a jam.',
        parts: ['120', '130'],
      },
      {
        at: 52.9,
        kind: 'tip',
        text: 'Tell the ports apart with a thread gauge: G 3/8 has 19 threads to the inch and is parallel, 3/8 NPT has 18 and is tapered.',
        parts: ['124'],
      },
      {
        at: 62.4,
        kind: 'change',
        text: 'The cylinder came with G 3/8 ports; the plans show 3/8 NPT. They nearly screw together and must not. Adapter 125 on both lines.',
        parts: ['124', '125'],
      },
      {
        at: 68.5,
        kind: 'caution',
        topic: 'pressure',
        text: 'Let the pressure down before you open a line. A jet of oil goes through skin.',
        parts: ['125'],
      },
      {
        at: 73.1,
        kind: 'setting',
        text: 'Relief valve set at 110 bar. The gauge reads to 250 bar.',
        parts: ['127', '129'],
      },
      {
        at: 81.6,
        kind: 'correction',
        text: 'I say “sixty millimetres” for how far the platen comes down in a pressing. It is 160 mm.',
        parts: ['106'],
      },
      {
        at: 86.3,
        kind: 'size',
        standing: 'plan',
        text: 'The drip tray slopes 10 mm to the spout.',
        parts: ['131', '132'],
      },
      { at: 91.8, kind: 'undecided', text: 'Whether the spout gets a valve.', parts: ['132'] },
      {
        at: 95.1,
        kind: 'ask',
        text: 'Who presses through a spout of 38.1 mm? Does it clog?',
        parts: ['132'],
      },
    ],
    onBench: [
      ['117', 0.8, 23.6],
      ['118', 24, 45],
      ['119', 24, 40],
      ['124', 45.8, 72.8],
      ['125', 62.4, 72.8],
      ['131', 86.3, 99],
    ],
  },
];

/** The episode that is being drafted over a clip as the camera made it; its notes are the editor's, half done. */
export const PRESS_DRAFT: DemoEpisode = {
  number: 5,
  title: 'The belt guard, and the first turn of the drum',
  about: '',
  video: { file: 'C0043.MOV', captions: 'C0043.vtt' },
  chapters: [[0, 'Belt guard']],
  notes: [
    {
      at: 0.8,
      kind: 'size',
      standing: 'as-said',
      text: 'Belt guard 480 x 260 mm, from 1.5 mm sheet.',
      parts: ['123'],
    },
    {
      at: 7,
      kind: 'size',
      text: 'Slots: 14 or 40 long? I hear fourteen; in the picture they look longer.',
      parts: ['123'],
      audience: 'person',
    },
    {
      at: 12.5,
      kind: 'setting',
      text: 'About 560 rpm at the drum: 1400 rpm, by 80 over 200. Check the small pulley.',
      parts: ['122', '130'],
      audience: 'team',
    },
    {
      at: 19.5,
      kind: 'caution',
      topic: 'rotating',
      text: 'Nothing turns under power until the belt guard is on.',
      parts: ['123'],
    },
    {
      at: 26.7,
      kind: 'step',
      text: 'Bracket done off camera. Is there a photo?',
      parts: [],
      audience: 'team',
    },
  ],
  onBench: [['123', 0.8, 12]],
};
