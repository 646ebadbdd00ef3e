import { type Answer, right, wrong } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { lengthField, optional, quantityField } from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';

export interface SquareResult {
  readonly angleDegrees: number | null;
  readonly offsetMm: number | null;
  /** What both diagonals of a true rectangle are. */
  readonly diagonalMm: number | null;
  /** Longer less shorter diagonal. */
  readonly diagonalsDifferMm: number | null;
  /** How far the corners are off 90°. */
  readonly outOfSquareDegrees: number | null;
  /** How far the far side has to be pushed along, over the height. */
  readonly pushMm: number | null;
}

const inputs = {
  offset: optional(lengthField('Offset', '35', { zero: true })),
  over: optional(lengthField('Over a length of', '1000')),
  angle: optional(quantityField('Angle', '2 deg', 'angle', 'deg')),
  width: optional(lengthField('Width', '800')),
  height: optional(lengthField('Height', '1200')),
  diagonal: optional(lengthField('One diagonal', '1443')),
  other: optional(lengthField('The other diagonal', '1441')),
};
type Values = ValuesOf<typeof inputs>;

const NOTHING: SquareResult = {
  angleDegrees: null,
  offsetMm: null,
  diagonalMm: null,
  diagonalsDifferMm: null,
  outOfSquareDegrees: null,
  pushMm: null,
};
const DEGREE = Math.PI / 180;

interface Found {
  readonly result: SquareResult;
  readonly step: {
    readonly what: string;
    readonly formula: string;
    readonly numbers: string;
    readonly value: string;
  };
}

function angleOf({ offset, over, angle }: Values): Answer<Found> {
  if (over === null || (offset === null) === (angle === null))
    return wrong('Give the length, and either the offset over it or the angle.');
  const length = over.valueOf();
  if (angle !== null) {
    if (angle.gte(90)) return wrong('Angle: it has to be less than 90°.');
    const offsetMm = Math.tan(angle.valueOf() * DEGREE) * length;
    return right({
      result: { ...NOTHING, angleDegrees: angle.valueOf(), offsetMm },
      step: {
        what: 'Offset',
        formula: 'o = L × tan α',
        numbers: `${formatNumber(length)} mm × tan ${formatNumber(angle.valueOf())}°`,
        value: `${formatNumber(offsetMm)} mm`,
      },
    });
  }
  const offsetMm = offset?.valueOf() ?? 0;
  const angleDegrees = Math.atan2(offsetMm, length) / DEGREE;
  return right({
    result: { ...NOTHING, angleDegrees, offsetMm },
    step: {
      what: 'Angle',
      formula: 'α = atan(o / L)',
      numbers: `${formatNumber(offsetMm)} mm / ${formatNumber(length)} mm`,
      value: `${formatNumber(angleDegrees)}°`,
    },
  });
}

function diagonalsOf({ width, height, diagonal, other }: Values): Answer<Found> {
  if (width === null || height === null) return wrong('Give width and height.');
  const [w, h] = [width.valueOf(), height.valueOf()];
  const diagonalMm = Math.hypot(w, h);
  const step = {
    what: 'Diagonal of a true rectangle',
    formula: 'd = √(w² + h²)',
    numbers: `√((${formatNumber(w)} mm)² + (${formatNumber(h)} mm)²)`,
    value: `${formatNumber(diagonalMm, 6)} mm`,
  };
  if ((diagonal === null) !== (other === null)) return wrong('Give both diagonals, or none.');
  if (diagonal === null || other === null) return right({ result: { ...NOTHING, diagonalMm }, step });
  const [a, b] = [diagonal.valueOf(), other.valueOf()];
  // In a parallelogram the squares of the diagonals differ by 4 w h cos of the corner: law of cosines.
  const cosine = (a * a - b * b) / (4 * w * h);
  const [least, most] = [Math.abs(w - h), w + h];
  if (Math.min(a, b) < least || Math.max(a, b) > most || Math.abs(cosine) > 1)
    return wrong(
      `These diagonals belong to no frame of that width and height: each is from ${formatNumber(least)} to ${formatNumber(most)} mm.`,
    );
  return right({
    result: {
      ...NOTHING,
      diagonalMm,
      diagonalsDifferMm: Math.abs(a - b),
      outOfSquareDegrees: Math.abs(Math.asin(cosine)) / DEGREE,
      pushMm: Math.abs(cosine) * h,
    },
    step,
  });
}

function compute(values: Values): Answer<Worked<SquareResult>> {
  const framed = [values.width, values.height, values.diagonal, values.other].some((value) => value !== null);
  const angled = [values.offset, values.over, values.angle].some((value) => value !== null);
  if (framed === angled)
    return wrong('Give an offset or angle over a length, or a frame’s width and height.');
  const found = framed ? diagonalsOf(values) : angleOf(values);
  if (!found.ok) return found;
  return right({
    result: found.value.result,
    working: [found.value.step],
    sources: [{ title: 'Trigonometry', clause: 'tangent; law of cosines', standing: 'published' }],
    limits: ['Flat: no twist. Opposite sides of a frame are of equal length.'],
    notChecked: ['Twist; whether opposite sides are equal.'],
    warnings: [],
    cautions: [],
  });
}

/** An angle from its offset and back, and whether a frame is square by its diagonals. */
export const squareWorksheet = worksheet({ id: 'square', title: 'Square and angle', inputs, compute });
