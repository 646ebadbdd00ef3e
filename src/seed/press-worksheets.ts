import { type AddWorksheet } from '../features/worksheets/worksheet.ts';

interface DemoWorksheet extends Pick<AddWorksheet, 'sheet' | 'title' | 'inputs' | 'visibility'> {
  /** The part that it belongs to, by number; null for the build. */
  readonly part: string | null;
}

/** The numbers behind the demo's press. */
export const PRESS_WORKSHEETS: readonly DemoWorksheet[] = [
  {
    sheet: 'square',
    title: 'Is the frame square?',
    inputs: { width: '740', height: '1450', diagonal: '1629', other: '1627' },
    part: null,
    visibility: 'public',
  },
  {
    sheet: 'seats',
    title: 'Drum shaft in its bearings',
    inputs: { bore: '35', outside: '72', shaft: 'k6', housing: 'H7', turning: 'inner' },
    part: '118',
    visibility: 'public',
  },
  {
    sheet: 'drive',
    title: 'How fast the drum turns',
    inputs: { rpm: '1400', driver: '80', driven: '200', diameter: '160' },
    part: '122',
    visibility: 'public',
  },
  {
    sheet: 'ports',
    title: 'Which ports the cylinder has',
    inputs: { diameter: '15.2', pitch: '19 tpi', side: 'internal', taper: 'no' },
    part: '125',
    visibility: 'public',
  },
  {
    sheet: 'ram',
    title: 'What the cylinder gives',
    inputs: {
      bore: '100',
      rod: '45',
      stroke: '600',
      pressure: '110 bar',
      pump: '8 L/min@25 bar, 2 L/min@110 bar',
      pressing: '160',
    },
    part: '124',
    visibility: 'private',
  },
];
