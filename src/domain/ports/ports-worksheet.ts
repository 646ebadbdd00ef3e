import type Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { inMillimetres, MILLIMETRES } from '../lengths/length.ts';
import { parseLength } from '../lengths/parse-length.ts';
import { readNumber } from '../lengths/read-number.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { choiceField, lengthField, optional, textField } from '../worksheets/fields.ts';
import { type Field, type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { FAMILIES, PORT_THREADS, type PortThread } from './port-threads.ts';

type Side = 'external' | 'internal';

/** A thread that nearly goes together with a candidate and must not be forced to. */
export interface NearThread {
  readonly name: string;
  readonly why: string;
}

/** A thread that this may be. */
export interface PortCandidate {
  readonly name: string;
  readonly standard: string;
  readonly side: Side;
  /** Likely: nothing else known here has this diameter and pitch. Possible: something has, or the pitch is not known. */
  readonly sure: 'likely' | 'possible';
  /** The reading less the nominal diameter of that side, mm. */
  readonly differenceMm: number;
  readonly pitch: string;
  readonly angle: number;
  readonly tapered: boolean;
  readonly seals: string;
  readonly mates: string;
  readonly neverWith: readonly NearThread[];
}

export interface PortsResult {
  readonly candidates: readonly PortCandidate[];
}

/** A pitch as a thread gauge says it: 19 tpi, 1.5 mm. In millimetres. */
const pitchField: Field<Fraction> = {
  ...textField('Pitch', '19 tpi'),
  read: (given) => {
    const text = textField('Pitch', '19 tpi').read(given);
    if (!text.ok) return text;
    const number = readNumber(text.value, 0);
    const unit = number === null ? '' : text.value.slice(number.end).trim();
    if (number !== null && /^(?:tpi|threads (?:an|per) inch|\/in)$/i.test(unit))
      return number.value.gte(4) && number.value.lte(80)
        ? right(MILLIMETRES.in.div(number.value))
        : wrong('A thread gauge has 4 to 80 threads an inch.');
    if (number !== null && unit === '')
      return wrong(`${text.value} has no unit. Write it as 19 tpi or 1.5 mm.`);
    const length = parseLength(text.value);
    if (!length.ok) return wrong(`${text.value} is no pitch. Write it as 19 tpi or 1.5 mm.`);
    const mm = inMillimetres(length.value);
    return mm.gte('0.25') && mm.lte(8) ? right(mm) : wrong('A pitch is from 0.25 to 8 mm.');
  },
};

const inputs = {
  diameter: lengthField('Diameter', '16.6'),
  pitch: optional(pitchField),
  side: optional(choiceField('Thread', ['external', 'internal'])),
  taper: optional(choiceField('Tapered', ['yes', 'no'])),
};
type Values = ValuesOf<typeof inputs>;

/** How far a pitch may be off and still be read as this one: a gauge tells 18 from 19 threads, which are 5 % apart. */
const PITCH_READING = 0.02;
/** Within these a thread starts into another: a turn or two go together before it binds or leaks. */
const [NEAR_PITCH, NEAR_DIAMETER] = [0.14, 0.9];

const apart = (a: number, b: number) => Math.abs(a - b) / Math.min(a, b);

function whyNever(own: PortThread, other: PortThread): string | null {
  if (other.name === own.name) return null;
  const [mine, others] = [FAMILIES[own.family], FAMILIES[other.family]];
  if (Math.abs(own.major - other.major) > NEAR_DIAMETER || apart(own.pitch, other.pitch) > NEAR_PITCH)
    return null;
  const differences = [
    ...(apart(own.pitch, other.pitch) > PITCH_READING ? [`${own.pitchName} against ${other.pitchName}`] : []),
    ...(mine.angle === others.angle ? [] : [`${String(mine.angle)}° against ${String(others.angle)}°`]),
    ...(mine.tapered === others.tapered
      ? []
      : [mine.tapered ? 'tapered against parallel' : 'parallel against tapered']),
  ];
  // The same thread with another way of sealing screws together fully, and leaks.
  if (differences.length === 0) return 'the same thread, which seals in another way';
  return differences.join(', ');
}

function differenceOf(thread: PortThread, side: Side, reading: number): number {
  const [least, most] = thread[side];
  if (side === 'external')
    return reading - (FAMILIES[thread.family].tapered ? (least + most) / 2 : thread.major);
  return reading - (least + most) / 2;
}

/** How far a reading lies outside what is met on a thread; zero within. */
function outsideOf([least, most]: readonly [number, number], reading: number): number {
  return Math.max(0, least - reading, reading - most);
}

/** Outside before inside where neither was said, and parallel before tapered: one reading means more on it. */
function rank({ thread, of }: { readonly thread: PortThread; readonly of: Side }): number {
  return (of === 'external' ? 0 : 2) + (FAMILIES[thread.family].tapered ? 1 : 0);
}

function find({ diameter, pitch, side, taper }: Values): readonly PortCandidate[] {
  const reading = diameter.valueOf();
  const sides: readonly Side[] = side === null ? ['external', 'internal'] : [side];
  const fitting = sides.flatMap((of) =>
    PORT_THREADS.filter(
      (thread) =>
        outsideOf(thread[of], reading) === 0 &&
        (pitch === null || apart(thread.pitch, pitch.valueOf()) <= PITCH_READING) &&
        (taper === null || FAMILIES[thread.family].tapered === (taper === 'yes')),
    ).map((thread) => ({ thread, of })),
  );
  const sure = fitting.length === 1 && pitch !== null ? 'likely' : 'possible';
  return fitting
    .map(({ thread, of }) => ({ thread, of, difference: differenceOf(thread, of, reading) }))
    .sort((a, b) => rank(a) - rank(b) || Math.abs(a.difference) - Math.abs(b.difference))
    .map(({ thread, of, difference }) => {
      const { standard, angle, tapered, seals, mates } = FAMILIES[thread.family];
      return {
        name: thread.name,
        standard,
        side: of,
        sure,
        differenceMm: Number(difference.toFixed(3)),
        pitch: thread.pitchName,
        angle,
        tapered,
        seals,
        mates,
        neverWith: PORT_THREADS.flatMap((other) => {
          const why = whyNever(thread, other);
          return why === null ? [] : [{ name: other.name, why }];
        }),
      };
    });
}

function compute(values: Values): Answer<Worked<PortsResult>> {
  const { diameter, pitch, taper } = values;
  if (diameter.lt(5) || diameter.gt(70)) return wrong('The ports known here measure from 5 to 70 mm.');
  const candidates = find(values);
  const tpi = pitch === null ? '' : ` (${formatNumber(MILLIMETRES.in.div(pitch).valueOf(), 4)} tpi)`;
  return right({
    result: { candidates },
    working: [
      {
        what: 'Threads that a caliper can read so',
        formula: 'diameter within tolerance and wear, pitch within 2 %',
        numbers: `${formatNumber(diameter.valueOf())} mm${pitch === null ? '' : `, ${formatNumber(pitch.valueOf())} mm${tpi}`}`,
        value: candidates.length === 0 ? 'none' : candidates.map(({ name }) => name).join(', '),
      },
    ],
    sources: [
      { title: 'ISO 228-1', clause: 'table 1', standing: 'memory' },
      { title: 'ISO 7-1', clause: 'table 1', standing: 'memory' },
      { title: 'ASME B1.20.1', clause: 'table 2', standing: 'memory' },
      { title: 'SAE J514, J1926-1, J1453; ISO 6149-1', clause: 'thread sizes', standing: 'memory' },
    ],
    limits: [
      'G, R and NPT to 2; JIC, ORB and face-seal to 2 1/2 in; metric ports to M60.',
      'External threads are read across the crests, internal ones across the crests inside.',
    ],
    notChecked: ['The rating of the port or fitting.', 'Depth, damage and plating of the thread.'],
    warnings: [
      ...(candidates.length === 0
        ? ['No port thread known here reads so. Measure again, and check the pitch with a gauge.']
        : []),
      ...(pitch === null ? ['Without the pitch this is a guess: 18 and 19 threads an inch look alike.'] : []),
      ...(candidates.length > 1 && taper === null
        ? [
            'More than one fits. See whether the thread is tapered, and how it seals: cone, O-ring, face or thread.',
          ]
        : []),
    ],
    cautions: ['pressure'],
  });
}

/** Which thread a port or fitting has, by caliper and thread gauge, and what it must never be mated with. */
export const portsWorksheet = worksheet({ id: 'ports', title: 'Ports', inputs, compute });
