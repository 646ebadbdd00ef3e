import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { lengthField, optional, quantityField } from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet, type WorkingStep } from '../worksheets/worksheet.ts';

export interface DriveResult {
  /** Input turns for one of the output; null where no drive was given. */
  readonly ratio: number | null;
  /** Speed of the output, or of the spindle alone, rev/min. */
  readonly rpm: number | null;
  /** At the diameter given. */
  readonly surfaceMPerMin: number | null;
  /** What the spindle has to turn at for the cutting speed. */
  readonly rpmForCutting: number | null;
  readonly beltMm: number | null;
  /** What the belt covers of the smaller pulley, degrees. */
  readonly wrapDegrees: number | null;
}

const inputs = {
  rpm: optional(quantityField('Speed of the motor or spindle', '1440', 'turning', 'rpm')),
  driver: optional(lengthField('Driver: diameter, or teeth', '80')),
  driven: optional(lengthField('Driven: diameter, or teeth', '240')),
  driver2: optional(lengthField('Second driver', '60')),
  driven2: optional(lengthField('Second driven', '180')),
  centres: optional(lengthField('Between the centres of the pulleys', '400')),
  diameter: optional(lengthField('Diameter of the work, drum or cutter', '300')),
  cutting: optional(quantityField('Cutting speed', '25 m/min', 'cutting', 'm/min')),
};
type Values = ValuesOf<typeof inputs>;

/** Least wrap of the small pulley that makers of V-belts ask for: common practice. */
const LEAST_WRAP = 120;

function ratioOf({ driver, driven, driver2, driven2 }: Values): Answer<number | null> {
  if ((driver === null) !== (driven === null)) return wrong('Give driver and driven together.');
  if ((driver2 === null) !== (driven2 === null)) return wrong('Give the second driver and driven together.');
  if (driver === null || driven === null)
    return driver2 === null ? right(null) : wrong('Give the first driver and driven before the second.');
  const first = driven.div(driver);
  return right((driver2 === null || driven2 === null ? first : first.mul(driven2.div(driver2))).valueOf());
}

/** An open belt, exactly: both straight runs, and the arcs that are covered. */
function beltOf({
  driver,
  driven,
  centres,
}: Values): Answer<{ readonly belt: number; readonly wrap: number } | null> {
  if (centres === null) return right(null);
  if (driver === null || driven === null) return wrong('Give both pulleys for the length of the belt.');
  const [small, large] = [driver.valueOf(), driven.valueOf()].sort((a, b) => a - b) as [number, number];
  const between = centres.valueOf();
  if (between <= (small + large) / 2) return wrong('Between the centres: the pulleys would touch.');
  const lean = Math.asin((large - small) / 2 / between);
  const belt =
    2 * between * Math.cos(lean) + ((Math.PI + 2 * lean) * large) / 2 + ((Math.PI - 2 * lean) * small) / 2;
  return right({ belt, wrap: 180 - (2 * lean * 180) / Math.PI });
}

function compute(values: Values): Answer<Worked<DriveResult>> {
  const ratio = ratioOf(values);
  if (!ratio.ok) return ratio;
  const belt = beltOf(values);
  if (!belt.ok) return belt;
  const { rpm, diameter, cutting } = values;
  if (rpm?.gt(100_000) === true) return wrong('Speed: speeds up to 100000 rev/min are computed here.');
  if (cutting !== null && diameter === null) return wrong('Give the diameter for the cutting speed.');
  const output = rpm === null ? null : rpm.valueOf() / (ratio.value ?? 1);
  const around = diameter === null ? null : (Math.PI * diameter.valueOf()) / 1000;
  const surface = output === null || around === null ? null : output * around;
  const needed = cutting === null || around === null ? null : cutting.valueOf() / around;
  if ([ratio.value, output, needed, belt.value].every((found) => found === null))
    return wrong('Give a speed, a pair of pulleys or gears, or a cutting speed with its diameter.');
  const show = formatNumber;
  const steps: (WorkingStep | null)[] = [
    ratio.value === null
      ? null
      : {
          what: 'Ratio',
          formula: 'i = driven / driver, of each pair',
          numbers: '',
          value: `${show(ratio.value)} : 1`,
        },
    output === null || rpm === null
      ? null
      : {
          what: 'Output',
          formula: 'n = n1 / i',
          numbers: `${show(rpm.valueOf())} rev/min / ${show(ratio.value ?? 1)}`,
          value: `${show(output)} rev/min`,
        },
    surface === null || output === null || diameter === null
      ? null
      : {
          what: 'Speed at the rim',
          formula: 'v = π × d × n',
          numbers: `π × ${show(diameter.valueOf())} mm × ${show(output)} rev/min`,
          value: `${show(surface)} m/min`,
        },
    needed === null || cutting === null || diameter === null
      ? null
      : {
          what: 'Speed for cutting',
          formula: 'n = v / (π × d)',
          numbers: `${show(cutting.valueOf())} m/min / (π × ${show(diameter.valueOf())} mm)`,
          value: `${show(needed)} rev/min`,
        },
    belt.value === null
      ? null
      : {
          what: 'Length of an open belt',
          formula: 'L = 2C cos β + (π + 2β) D/2 + (π − 2β) d/2, sin β = (D − d) / 2C',
          numbers: `C ${show(values.centres?.valueOf() ?? 0)} mm`,
          value: `${show(belt.value.belt)} mm`,
        },
  ];
  return right({
    result: {
      ratio: ratio.value,
      rpm: output,
      surfaceMPerMin: surface,
      rpmForCutting: needed,
      beltMm: belt.value?.belt ?? null,
      wrapDegrees: belt.value?.wrap ?? null,
    },
    working: steps.filter((step) => step !== null),
    sources: [
      {
        title: 'Geometry of pulleys and gears',
        clause: 'ratio, rim speed, open belt',
        standing: 'published',
      },
      { title: 'Wrap of at least 120°', clause: 'makers of V-belts', standing: 'practice' },
    ],
    limits: [
      'No slip; V-belts on their pitch diameters. The plate of a motor gives its speed under load.',
      'A belt is sold by its own length system: take the next size and move a pulley.',
    ],
    notChecked: [
      'What the belt, chain, shaft or gears carry.',
      'The speed that a wheel, drum or cutter is rated for.',
    ],
    warnings:
      belt.value !== null && belt.value.wrap < LEAST_WRAP
        ? [`The belt covers ${show(belt.value.wrap, 3)}° of the small pulley; 120° or more is usual.`]
        : [],
    cautions: ['rotating', 'pinch'],
  });
}

/** Speeds through pulleys, chains and gears, and for cutting. */
export const driveWorksheet = worksheet({ id: 'drive', title: 'Drives and speeds', inputs, compute });
