import { type Answer, right, wrong } from '../answer.ts';
import { choiceField, lengthField } from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { bearingBore, bearingOutside, USUAL_SEATS } from './bearings.ts';
import { type Fit, fitOf } from './fit.ts';
import { classField, sayDeviations, workFit } from './fit-worksheet.ts';
import { type Deviations, limitDeviations } from './iso-286.ts';

/** One ring of a bearing and its seat; micrometres. */
export interface Seat {
  readonly bearing: Deviations;
  readonly seat: Deviations;
  readonly fit: Fit;
  /** Tight in the middle of both limits. */
  readonly tight: boolean;
}

/** Both seats of a bearing, and what is usual for how its load turns. */
export interface SeatsResult {
  readonly inner: Seat;
  readonly outer: Seat;
  readonly usualShaft: string;
  readonly usualHousing: string;
}

const inputs = {
  bore: lengthField('Bore', '25'),
  outside: lengthField('Outside diameter', '52'),
  shaft: classField('Shaft', 'k6', 'shaft'),
  housing: classField('Housing', 'H7', 'hole'),
  turning: choiceField('Ring that turns under the load', ['inner', 'outer']),
};
type Values = ValuesOf<typeof inputs>;

function seat(bearing: Deviations, own: Deviations, ring: 'inner' | 'outer'): Seat {
  const fit = ring === 'inner' ? fitOf(bearing, own) : fitOf(own, bearing);
  return { bearing, seat: own, fit, tight: fit.least + fit.most < 0 };
}

function warn(inner: Seat, outer: Seat, turning: 'inner' | 'outer'): readonly string[] {
  const turns = turning === 'inner' ? inner : outer;
  return [
    ...(inner.tight && outer.tight
      ? [
          'Both rings are tight: the bearing loses its internal clearance, neither ring can move with heat, and it cannot be pressed on and in without load on its balls. Make one a slide fit, or ask the maker for a larger internal clearance.',
        ]
      : []),
    ...(turns.tight
      ? []
      : [`The ${turning} ring turns under the load and is not tight: it creeps and wears its seat.`]),
  ];
}

function compute({ bore, outside, shaft, housing, turning }: Values): Answer<Worked<SeatsResult>> {
  if (outside.lte(bore)) return wrong('The outside diameter has to be larger than the bore.');
  const [inside, around] = [bearingBore(bore), bearingOutside(outside)];
  if (inside === null || around === null)
    return wrong('The tables of bearings here go from 0.6 mm bore to 500 mm outside.');
  const shaftLimits = limitDeviations(bore, shaft);
  if (!shaftLimits.ok) return shaftLimits;
  const housingLimits = limitDeviations(outside, housing);
  if (!housingLimits.ok) return housingLimits;
  const inner = seat(inside, shaftLimits.value, 'inner');
  const outer = seat(around, housingLimits.value, 'outer');
  const usual = USUAL_SEATS[turning];
  return right({
    result: { inner, outer, usualShaft: usual.shaft, usualHousing: usual.housing },
    working: [
      {
        what: 'Bore of the bearing',
        formula: 'by table',
        numbers: `${bore.toString()} mm`,
        value: sayDeviations(inside),
      },
      {
        what: `Shaft ${shaft.name}`,
        formula: 'by table',
        numbers: `${bore.toString()} mm`,
        value: sayDeviations(inner.seat),
      },
      ...workFit(inside, inner.seat, inner.fit),
      {
        what: `Housing ${housing.name}`,
        formula: 'by table',
        numbers: `${outside.toString()} mm`,
        value: sayDeviations(outer.seat),
      },
      {
        what: 'Outside of the bearing',
        formula: 'by table',
        numbers: `${outside.toString()} mm`,
        value: sayDeviations(around),
      },
      ...workFit(outer.seat, around, outer.fit),
    ],
    sources: [
      { title: 'ISO 492:2014', clause: 'tables 1 and 2, Normal class', standing: 'memory' },
      { title: 'ISO 286-1:2010', clause: 'tables 1 to 5', standing: 'memory' },
      {
        title: 'Seats by how the load turns',
        clause: 'as bearing makers’ catalogues agree',
        standing: 'practice',
      },
    ],
    limits: [
      'Radial ball and roller bearings of Normal class, steel shaft, thick iron or steel housing.',
      'The load keeps its direction; where it goes round with the shaft, the rings change places.',
    ],
    notChecked: [
      'The load and life of the bearing; its internal clearance once it is pressed in.',
      'Heat between shaft and housing.',
      'Roundness of the seats, which is to be finer than the tolerance.',
    ],
    warnings: warn(inner, outer, turning),
    cautions: ['rotating'],
  });
}

/** The seats of a bearing on its shaft and in its housing. */
export const seatsWorksheet = worksheet({ id: 'seats', title: 'Bearing seats', inputs, compute });
