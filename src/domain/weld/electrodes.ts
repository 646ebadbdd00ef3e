import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';

/** A covered electrode by its class. */
export interface Electrode {
  /** As AWS A5.1 writes it: E7018. */
  readonly name: string;
  /** Least tensile strength of the weld metal, ksi: the first two digits. */
  readonly strengthKsi: 60 | 70;
  readonly lowHydrogen: boolean;
}

/** Last two digits with a low-hydrogen coating: AWS A5.1, table 1. From memory. */
const LOW_HYDROGEN = ['15', '16', '18', '28', '48'];
/** All classes that are read: AWS A5.1, table 1. From memory. */
const CLASSES = [
  '6010',
  '6011',
  '6012',
  '6013',
  '6019',
  '6020',
  '6022',
  '6027',
  '7014',
  '7015',
  '7016',
  '7018',
  '7024',
  '7027',
  '7028',
  '7048',
];

/** An electrode class, with or without its E and what may follow a hyphen: E7018, 6013, E7018-1. */
export function parseElectrode(text: string): Answer<Electrode> {
  const [, digits = ''] = /^E?(\d{4})(?:-[A-Z0-9]+)?$/i.exec(text.trim()) ?? [];
  if (!CLASSES.includes(digits))
    return wrong(
      /^ER|^E\d{2,3}T|^E?R?308|^E?309|^E?316/i.test(text.trim())
        ? 'This covers stick welding of plain steel; wire, rods and stainless electrodes are not covered.'
        : `${text.trim().slice(0, 20)} is no electrode that is known here. Write its AWS A5.1 class, such as E7018.`,
    );
  return right({
    name: `E${digits}`,
    strengthKsi: digits.startsWith('6') ? 60 : 70,
    lowHydrogen: LOW_HYDROGEN.includes(digits.slice(2)),
  });
}

/** Trade diameters of electrodes: in inches as a name, and the metric ones sold beside it, mm. */
const DIAMETERS: readonly (readonly [inches: string, metric: readonly string[]])[] = [
  ['1/16', ['1.6']],
  ['3/32', ['2.4', '2.5']],
  ['1/8', ['3.2', '3.25']],
  ['5/32', ['4']],
  ['3/16', ['4.8', '5']],
  ['7/32', ['5.5', '5.6']],
  ['1/4', ['6', '6.3', '6.4']],
  ['5/16', ['8']],
];

/** The trade diameter that a size is, in inches; null for one that is not sold. Inches may be rounded to 0.01 mm. */
export function tradeDiameter(mm: Fraction): string | null {
  const found = DIAMETERS.find(
    ([inches, metric]) =>
      new Fraction(inches).mul('25.4').sub(mm).abs().lte('0.01') || metric.some((size) => mm.equals(size)),
  );
  return found?.[0] ?? null;
}

/** The trade diameters, for a sentence. */
export const TRADE_DIAMETERS = DIAMETERS.map(
  ([inches, [metric]]) => `${inches} in (${metric ?? ''} mm)`,
).join(', ');

type Range = readonly [least: number, most: number];

/**
 * Current in amperes by class and diameter: Machinery's Handbook, 31st edition, page 1594, tables 13 and 14. The column
 * of E6013 was matched to its diameters by position; it has no 7/32.
 */
const CURRENTS: Readonly<Record<string, Readonly<Record<string, Range>>>> = {
  E6013: {
    '1/16': [20, 40],
    '3/32': [50, 100],
    '1/8': [75, 135],
    '5/32': [110, 185],
    '3/16': [150, 235],
    '1/4': [240, 340],
    '5/16': [310, 425],
  },
  E7014: {
    '3/32': [75, 120],
    '1/8': [110, 155],
    '5/32': [145, 210],
    '3/16': [190, 280],
    '7/32': [255, 335],
    '1/4': [330, 415],
    '5/16': [380, 490],
  },
  E7018: {
    '3/32': [70, 105],
    '1/8': [110, 160],
    '5/32': [150, 215],
    '3/16': [180, 275],
    '7/32': [255, 350],
    '1/4': [295, 360],
    '5/16': [370, 480],
  },
  E7024: {
    '3/32': [85, 135],
    '1/8': [130, 180],
    '5/32': [175, 240],
    '3/16': [230, 315],
    '7/32': [280, 370],
    '1/4': [325, 450],
    '5/16': [390, 530],
  },
};

/** The range of current of an electrode; null where the tables have none. */
export function currentRange({ name }: Electrode, diameter: string): Range | null {
  return CURRENTS[name]?.[diameter] ?? null;
}
