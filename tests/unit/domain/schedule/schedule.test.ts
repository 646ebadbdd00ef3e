import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import {
  findCriticalPath,
  fromThreeGuesses,
  type ScheduledStage,
} from '../../../../src/domain/schedule/critical-path.ts';
import {
  type Clock,
  PLAIN_CLOCK,
  shopClock,
  type WeekHours,
} from '../../../../src/domain/schedule/shop-calendar.ts';

const f = (value: number | string) => new Fraction(value);
const stage = (
  id: string,
  guesses: readonly [number, number, number] | number,
  after = '',
  rest: Partial<ScheduledStage> = {},
): ScheduledStage => {
  const [least, likely, most] = typeof guesses === 'number' ? [guesses, guesses, guesses] : guesses;
  return {
    id,
    ...fromThreeGuesses(f(least), f(likely), f(most)),
    after: [...after],
    wait: f(0),
    notBefore: f(0),
    ...rest,
  };
};
function path(stages: readonly ScheduledStage[], clock: Clock = PLAIN_CLOCK) {
  const found = findCriticalPath(stages, clock);
  if (!found.ok) throw new Error(found.error);
  return found.value;
}
const refusal = (stages: readonly ScheduledStage[]) => {
  const found = findCriticalPath(stages, PLAIN_CLOCK);
  return found.ok ? '' : found.error;
};

/** A published exercise with fourteen activities and three guesses each (a question-and-answer site for students). */
const FOURTEEN = [
  stage('A', [5, 5, 7]),
  stage('B', [1, 2, 5]),
  stage('C', [5, 5, 5], 'A'),
  stage('D', [4, 8, 13], 'A'),
  stage('E', [1, 10, 17], 'BC'),
  stage('F', [1, 5, 7], 'D'),
  stage('G', [2, 6, 9], 'D'),
  stage('H', [4, 4, 6], 'EF'),
  stage('I', [2, 7, 10], 'GH'),
  stage('J', [2, 4, 7], 'I'),
  stage('K', [6, 10, 13], 'I'),
  stage('L', [2, 6, 6], 'J'),
  stage('M', [2, 2, 3], 'K'),
  stage('N', [7, 7, 12], 'LM'),
];

describe('A schedule', () => {
  it('has the published means and slacks of fourteen activities', () => {
    const means = [5.33, 2.33, 5, 8.17, 9.67, 4.67, 5.83, 4.33, 6.67, 4.17, 9.83, 5.33, 2.17, 7.83];
    expect(FOURTEEN.map(({ work }) => Number(work.valueOf().toFixed(2)))).toEqual(means);
    const { stages, critical, end, variance } = path(FOURTEEN);
    const slacks = Object.fromEntries(
      stages.map(({ id, slack }) => [id, Number(slack.valueOf().toFixed(2))]),
    );
    // A to F as published; G, J and L computed apart from this code.
    expect(slacks).toMatchObject({ A: 0, B: 8, C: 0, D: 1.83, E: 0, F: 1.83, G: 5, J: 2.5, L: 2.5 });
    expect(critical.join('')).toBe('ACEHIKMN');
    expect(end.valueOf()).toBeCloseTo(50.833, 3);
    expect(variance.valueOf()).toBeCloseTo(11.194, 3);
  });

  it('has the critical chain of a well-known example', () => {
    // The example of an encyclopaedia's article on the method; from memory.
    const seven = [
      stage('A', [2, 4, 6]),
      stage('B', [3, 5, 9]),
      stage('C', [4, 5, 7], 'A'),
      stage('D', [4, 6, 10], 'A'),
      stage('E', [4, 5, 7], 'BC'),
      stage('F', [3, 4, 8], 'D'),
      stage('G', [3, 5, 8], 'E'),
    ];
    const { critical, end } = path(seven);
    expect([critical.join(''), end.valueOf()]).toEqual(['ACEG', 19.5]);
  });

  it('keeps parallel chains, several starts and ends, and milestones', () => {
    const { critical, end } = path([stage('A', 3), stage('B', 3), stage('C', 0, 'AB'), stage('D', 1)]);
    expect([[...critical].sort().join(''), end.valueOf()]).toEqual(['ABC', 3]);
  });

  it('waits for a delivery and for paint', () => {
    const { stages, end } = path([
      stage('A', 2, '', { wait: f(3) }),
      stage('B', 1, 'A'),
      stage('C', 1, '', { notBefore: f(4) }),
    ]);
    expect(stages.find(({ id }) => id === 'B')?.earliestStart.valueOf()).toBe(5);
    expect([stages.find(({ id }) => id === 'C')?.slack.valueOf(), end.valueOf()]).toEqual([1, 6]);
  });

  it.each([
    [[stage('A', 1, 'B'), stage('B', 1, 'A')], 'in a circle: A, B'],
    [[stage('A', 1, 'A')], 'in a circle'],
    [[stage('A', 1, 'Z')], 'no stage here'],
    [[stage('A', 1), stage('A', 2)], 'two stages A'],
  ])('refuses %#', (stages, sentence) => {
    expect(refusal(stages)).toContain(sentence);
  });

  it('refuses guesses that fall', () => {
    expect(() => fromThreeGuesses(f(5), f(4), f(6))).toThrow(RangeError);
  });

  it('never starts a stage before what it waits for has ended, and never has slack below zero', () => {
    const graph = fc.array(fc.record({ work: fc.nat(20), after: fc.array(fc.nat(9), { maxLength: 3 }) }), {
      minLength: 1,
      maxLength: 10,
    });
    fc.assert(
      fc.property(graph, fc.boolean(), (drawn, inShop) => {
        const stages = drawn.map(({ work, after }, at) =>
          stage(String(at), work, after.filter((other) => other < at).join('')),
        );
        const clock = inShop ? shopClock(HOURS, 2) : PLAIN_CLOCK;
        const found = path(
          stages.map((one) => ({ ...one, after: [...new Set(one.after)] })),
          clock,
        );
        const times = new Map(found.stages.map((one) => [one.id, one]));
        for (const { id, after } of stages) {
          for (const other of after)
            expect(times.get(id)!.earliestStart.gte(times.get(other)!.earliestEnd)).toBe(true);
          expect(times.get(id)!.slack.gte(0)).toBe(true);
        }
        if (stages.some(({ work }) => work.gt(0))) expect(found.critical.length).toBeGreaterThan(0);
      }),
    );
  });
});

/** Wednesdays four hours, Saturdays six. */
const HOURS: WeekHours = [f(0), f(0), f(4), f(0), f(0), f(6), f(0)];

describe('Shop hours', () => {
  // From a Monday: day 2 is the first Wednesday, day 5 the first Saturday.
  const clock = shopClock(HOURS, 0);
  it.each([
    [0, 2, 2.5],
    [0, 4, 3],
    [0, 5, '31/6'],
    [0, 10, 6],
    [2.5, 2, 3],
    [0, 20, 13],
  ])('from day %d, %d hours are done at %s', (from, work, at) => {
    expect(clock.after(f(from), f(work)).equals(f(at))).toBe(true);
  });

  it('go back as they went', () => {
    expect(clock.before(f(6), f(6)).valueOf()).toBe(5);
    expect(clock.before(f(6), f(8)).valueOf()).toBe(2.5);
  });

  it('have to be some, and end', () => {
    const none: WeekHours = [f(0), f(0), f(0), f(0), f(0), f(0), f(0)];
    expect(() => shopClock(none, 0)).toThrow('some shop hours');
    expect(() => clock.after(f(0), f(1_000_000))).toThrow('twenty years');
  });
});
