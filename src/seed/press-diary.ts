/** A photo of src/seed/media and what it shows, for those who cannot see it. */
interface DemoPhoto {
  readonly file: string;
  readonly description: string;
}

export interface DemoEntry {
  readonly day: string;
  /** By its name in the list of stages. */
  readonly stage: string;
  readonly text: string;
  readonly visibility: 'private' | 'public';
  readonly photos?: readonly DemoPhoto[];
}

/** The diary of the demo's build, oldest first. */
export const PRESS_DIARY: readonly DemoEntry[] = [
  {
    day: '2026-09-19',
    stage: 'Frame',
    text: 'Steel came on a wet Saturday. Two lengths of 100 x 50 x 4, one of 80 x 80 x 5, the channel for the head beam. Wiped the oil off everything and marked out **101** and **102** before tea.',
    visibility: 'public',
  },
  {
    day: '2026-09-26',
    stage: 'Frame',
    text: 'Frame tacked, and out by two: 1627 against 1629. One clamp from corner to corner and it came in without a fight. All eight gussets are on.',
    visibility: 'public',
    photos: [
      {
        file: 'frame-square.jpg',
        description:
          'Drawing of the frame from the front, with both diagonals and the clamp that pulls the long one in.',
      },
    ],
  },
  {
    day: '2026-10-04',
    stage: 'Racks and cloths',
    text: 'Sixty-four slats through the saw, four of them spare. The jig is a stop, a toggle clamp and a piece of string, and it never lost its place.',
    visibility: 'public',
  },
  {
    day: '2026-10-10',
    stage: 'Racks and cloths',
    text: 'Six racks together, pegged and dry. They rattle, as they should.',
    visibility: 'public',
    photos: [
      {
        file: 'rack.jpg',
        description:
          'Drawing of one rack from above: ten ash slats in a square frame, twelve millimetres between them.',
      },
    ],
  },
  {
    day: '2026-10-17',
    stage: 'Drum and bearings',
    text: 'Second maple blank. The first had a knot that opened at 140 mm and would have let a blade go one day. It makes good kindling.',
    visibility: 'private',
  },
  {
    day: '2026-10-24',
    stage: 'Drum and bearings',
    text: 'Drum at 160.4 mm and round. Slots cut, blades numbered with a paint pen, one to eight.',
    visibility: 'public',
    photos: [
      {
        file: 'drum-end.jpg',
        description: 'Drawing of the drum from its end: eight blades in their slots, numbered one to eight.',
      },
    ],
  },
  {
    day: '2026-11-02',
    stage: 'Drum and bearings',
    text: 'Shaft done between centres. Both bearing seats at 35.009 mm, warm bearings slid on by hand.',
    visibility: 'public',
  },
  {
    day: '2026-11-05',
    stage: 'Hydraulics',
    text: 'The cylinder came, a week late. The ports are not what I drew: parallel, nineteen to the inch. **G 3/8**, where the plans say 3/8 NPT. Nothing gets forced; two adapters are ordered and have a number, 125.',
    visibility: 'public',
    photos: [
      {
        file: 'port-threads.jpg',
        description: 'Drawing of two threads side by side: G 3/8, parallel, and 3/8 NPT, tapered.',
      },
    ],
  },
  {
    day: '2026-11-14',
    stage: 'Hydraulics',
    text: 'Relief valve set to 110 bar on a borrowed gauge, with the ram against its stop. I want to see the same on our own gauge before anything is under it.',
    visibility: 'private',
  },
  {
    day: '2026-11-24',
    stage: 'Mill',
    text: 'Belt guard folded and hung on its slots. Filmed it (C0043). The bracket behind it is welded, off camera.',
    visibility: 'private',
    photos: [
      {
        file: 'belt-guard.jpg',
        description: 'Drawing of the belt guard from the front: sheet with a row of slots, hung on two feet.',
      },
    ],
  },
];
