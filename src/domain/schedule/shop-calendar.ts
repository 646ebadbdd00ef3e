import Fraction from 'fraction.js';

/** How time passes while work is done. Moments are counted from the start; what one is, the clock says. */
export interface Clock {
  /** When work that starts at a moment is done. */
  readonly after: (moment: Fraction, work: Fraction) => Fraction;
  /** When work has to start to be done by a moment. */
  readonly before: (moment: Fraction, work: Fraction) => Fraction;
}

/** Work and time are the same: plain durations. */
export const PLAIN_CLOCK: Clock = {
  after: (moment, work) => moment.add(work),
  before: (moment, work) => moment.sub(work),
};

/** Shop hours of each weekday, Monday first. */
export type WeekHours = readonly [
  monday: Fraction,
  tuesday: Fraction,
  wednesday: Fraction,
  thursday: Fraction,
  friday: Fraction,
  saturday: Fraction,
  sunday: Fraction,
];

/** The farthest that is planned, in days: about twenty years. */
const DAYS_AT_MOST = 7300;

/**
 * A clock of days from a first one, in which work only goes on in shop hours: half of a day's hours is half a day.
 * @param firstWeekday of day 0: 0 for Monday
 * @throws RangeError where there are no shop hours, or the work goes on for more than about twenty years
 */
export function shopClock(hours: WeekHours, firstWeekday: number): Clock {
  if (hours.every((day) => day.lte(0))) throw new RangeError('A week needs some shop hours.');
  const hoursOn = (day: number) => hours[(((day + firstWeekday) % 7) + 7) % 7] ?? new Fraction(0);
  const walk = (moment: Fraction, work: Fraction, step: 1 | -1): Fraction => {
    let [at, left] = [moment, work];
    for (let days = 0; days <= DAYS_AT_MOST; days += 1) {
      if (left.lte(0)) return at;
      // Going back from midnight means the day before.
      const day = step === 1 ? at.floor() : at.ceil().sub(1);
      const edge = step === 1 ? day.add(1) : day;
      const available = hoursOn(Number(day.valueOf()));
      const open = available.mul(edge.sub(at).abs());
      if (available.gt(0) && open.gte(left)) return at.add(left.div(available).mul(step));
      left = left.sub(open);
      at = edge;
    }
    throw new RangeError('This takes more than twenty years.');
  };
  return {
    after: (moment, work) => walk(moment, work, 1),
    before: (moment, work) => walk(moment, work, -1),
  };
}
