import { type NoteKind, type SizeStanding } from '../domain/note-kinds.ts';

export interface DemoNote {
  /** Seconds into the episode. */
  readonly at: number;
  readonly kind: NoteKind;
  readonly text: string;
  readonly parts: readonly string[];
  readonly standing?: SizeStanding;
  readonly topic?: string;
}

export interface DemoEpisode {
  readonly number: number;
  readonly title: string;
  readonly publishedOn: string;
  readonly address: string;
  /** As a person types it. */
  readonly length: string;
  readonly chapters: readonly (readonly [at: number, title: string])[];
  readonly notes: readonly DemoNote[];
}

/** The demo's episodes whose videos are elsewhere. */
export const PRESS_EPISODES: readonly DemoEpisode[] = [
  {
    number: 1,
    title: 'Square tubes and a square frame',
    publishedOn: '2026-10-01',
    address: 'https://video.example/marram-lane/press-1',
    length: '10:20',
    chapters: [
      [0, 'What it has to hold'],
      [95, 'Cutting the rails'],
      [380, 'Tacking it square'],
    ],
    notes: [
      {
        at: 102,
        kind: 'size',
        standing: 'plan',
        text: 'Base rails are 900 mm, both cut in one clamping.',
        parts: ['101'],
      },
      {
        at: 214,
        kind: 'step',
        text: 'Uprights stand on the rails, not beside them; the load goes straight down.',
        parts: ['102', '101'],
      },
      {
        at: 395,
        kind: 'size',
        standing: 'as-made',
        text: 'Diagonals came out at 1642 mm and 1643 mm. Pulled in with one clamp before welding.',
        parts: ['102', '103'],
      },
      {
        at: 420,
        kind: 'caution',
        topic: 'fumes',
        text: 'Weld with the doors open and the fan behind you. Keep your head out of the plume.',
        parts: [],
      },
      {
        at: 505,
        kind: 'setting',
        text: 'Gussets to base rail: E7018, 3.2 mm rods, 115 A.',
        parts: ['104', '101'],
      },
    ],
  },
  {
    number: 2,
    title: 'Sixty slats and six racks',
    publishedOn: '2026-10-15',
    address: 'https://video.example/marram-lane/press-2',
    length: '9:05',
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
        text: 'Slats 18 x 8 x 460 mm, sixty of them and four spare.',
        parts: ['108'],
      },
      {
        at: 150,
        kind: 'caution',
        topic: 'dust',
        text: 'Ash dust is bad for the lungs. Extraction on, mask on.',
        parts: [],
      },
      {
        at: 345,
        kind: 'step',
        text: 'Frames are pegged, not glued: glue and juice do not go together.',
        parts: ['109', '108'],
      },
      {
        at: 470,
        kind: 'undecided',
        text: 'Cloths with or without a hem. I will press once with each.',
        parts: ['110'],
      },
    ],
  },
  {
    number: 3,
    title: 'Turning the drum',
    publishedOn: '2026-10-29',
    address: 'https://video.example/marram-lane/press-3',
    length: '8:40',
    chapters: [
      [0, 'The blank'],
      [60, 'Roughing and truing'],
      [290, 'Blades'],
    ],
    notes: [
      { at: 66, kind: 'setting', text: 'Roughing at 350 rpm, finishing at 700 rpm.', parts: ['120'] },
      {
        at: 180,
        kind: 'size',
        standing: 'as-made',
        text: 'Drum is 160.4 mm across; the plan says 160 mm and the comb adjusts.',
        parts: ['120', '115'],
      },
      {
        at: 300,
        kind: 'caution',
        topic: 'rotating',
        text: 'No gloves, no sleeves near the drum. Stop it before you touch it.',
        parts: ['120'],
      },
      {
        at: 410,
        kind: 'tip',
        text: 'Number blades and slots with a paint pen before you take them out again.',
        parts: ['121'],
      },
    ],
  },
  {
    number: 4,
    title: 'The drum shaft, its bearings and the wrong port thread',
    publishedOn: '2026-11-12',
    address: 'https://video.example/marram-lane/press-4',
    length: '14:08',
    chapters: [
      [0, 'Drum shaft'],
      [195, 'Bearing housings'],
      [360, 'Gussets'],
      [520, 'Cylinder and ports'],
      [725, 'Drip tray'],
    ],
    notes: [
      {
        at: 58,
        kind: 'step',
        text: 'Face and centre the drum shaft, 412 mm, from 40 mm bright bar.',
        parts: ['117'],
      },
      {
        at: 130,
        kind: 'size',
        standing: 'as-made',
        text: 'Bearing seats came out at 35.009 mm. The plan says 35 k6: 35.002 to 35.018 mm. Inside.',
        parts: ['117', '119'],
      },
      {
        at: 220,
        kind: 'step',
        text: 'Bearing housings go on through slotted feet, so the drum can be squared up before the bolts are nipped.',
        parts: ['118'],
      },
      {
        at: 306,
        kind: 'caution',
        topic: 'rotating',
        text: 'Guard the drum before it turns under power. Lock out the motor to clear a jam.',
        parts: ['120'],
      },
      {
        at: 391,
        kind: 'setting',
        text: 'Gussets to base rail: E7018, 3.2 mm rods, 115 A.',
        parts: ['104', '101'],
      },
      {
        at: 554,
        kind: 'change',
        text: 'The cylinder came with G 3/8 ports; the plans show 3/8 NPT. They nearly screw together and must not. Adapter 125 on both lines.',
        parts: ['124', '125'],
      },
      {
        at: 590,
        kind: 'caution',
        topic: 'pressure',
        text: 'Oil at this pressure goes through skin. Let the pressure down before you open a line.',
        parts: ['124', '126'],
      },
      {
        at: 680,
        kind: 'correction',
        text: 'I say “sixty millimetres” for the platen travel. It is 160 mm.',
        parts: ['106'],
      },
      { at: 755, kind: 'step', text: 'The drip tray slopes 10 mm to the spout.', parts: ['131', '132'] },
    ],
  },
];
