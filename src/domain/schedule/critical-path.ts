import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { type Clock } from './shop-calendar.ts';

/** A step of the build as the schedule needs it. */
export interface ScheduledStage {
  readonly id: string;
  /** Expected work, in the clock's work. */
  readonly work: Fraction;
  /** Variance of the work; zero where one number was given. */
  readonly variance: Fraction;
  /** What has to be done before. */
  readonly after: readonly string[];
  /** Time that passes after the work without any: paint dries, glue sets. In the clock's moments. */
  readonly wait: Fraction;
  /** Not before this moment: a delivery. */
  readonly notBefore: Fraction;
}

/** When a stage can start and end, and when it has to. Moments of the clock. */
export interface StageTimes {
  readonly id: string;
  readonly earliestStart: Fraction;
  readonly earliestEnd: Fraction;
  readonly latestStart: Fraction;
  readonly latestEnd: Fraction;
  /** How much later it may start without moving the end. */
  readonly slack: Fraction;
  readonly critical: boolean;
}

export interface CriticalPath {
  readonly end: Fraction;
  readonly stages: readonly StageTimes[];
  /** Stages without slack, in order. */
  readonly critical: readonly string[];
  /** Of the work on the critical chain; of the longest-varying one where there are several. */
  readonly variance: Fraction;
}

/**
 * Expected work and its variance from three guesses: (a + 4m + b) / 6 and ((b − a) / 6)², D. G. Malcolm and others,
 * Operations Research 7 (1959).
 * @throws RangeError where the guesses fall
 */
export function fromThreeGuesses(least: Fraction, likely: Fraction, most: Fraction) {
  if (least.gt(likely) || likely.gt(most)) throw new RangeError('Least, likely and most have to rise.');
  const spread = most.sub(least).div(6);
  return { work: likely.mul(4).add(least).add(most).div(6), variance: spread.mul(spread) };
}

/** Stages in an order in which each stands after what it waits for; or why there is none. */
function inOrder(stages: readonly ScheduledStage[]): Answer<readonly ScheduledStage[]> {
  const byId = new Map(stages.map((stage) => [stage.id, stage]));
  if (byId.size < stages.length) {
    const twice = stages.find(({ id }, at) => stages.findIndex((other) => other.id === id) !== at);
    return wrong(`There are two stages ${twice?.id ?? ''}.`);
  }
  const order: ScheduledStage[] = [];
  const left = new Map(stages.map(({ id, after }) => [id, new Set(after)]));
  for (const { id, after } of stages)
    for (const other of after)
      if (!byId.has(other)) return wrong(`${id} waits for ${other}, which is no stage here.`);
  let ready = stages.filter(({ after }) => after.length === 0);
  while (ready.length > 0) {
    const next: ScheduledStage[] = [];
    for (const stage of ready) {
      order.push(stage);
      left.delete(stage.id);
      for (const [id, waits] of left) {
        if (!waits.delete(stage.id) || waits.size > 0) continue;
        const free = byId.get(id);
        if (free !== undefined) next.push(free);
      }
    }
    ready = next;
  }
  if (left.size === 0) return right(order);
  return wrong(`These stages wait for each other in a circle: ${[...left.keys()].slice(0, 8).join(', ')}.`);
}

const latest = (moments: readonly Fraction[], otherwise: Fraction) =>
  moments.reduce((most, moment) => (moment.gt(most) ? moment : most), otherwise);
const earliest = (moments: readonly Fraction[], otherwise: Fraction) =>
  moments.reduce((least, moment) => (moment.lt(least) ? moment : least), otherwise);

const ZERO = new Fraction(0);

/**
 * Earliest and latest moments of each stage, and the critical chain: J. E. Kelley and M. R. Walker, Critical-Path
 * Planning and Scheduling (1959), finish to start. Each stage has the clock to itself: two at one time share no hours.
 * @returns the sentence for a circle, an unknown forerunner or a stage that is there twice
 */
export function findCriticalPath(stages: readonly ScheduledStage[], clock: Clock): Answer<CriticalPath> {
  const ordered = inOrder(stages);
  if (!ordered.ok) return ordered;
  const early = new Map<string, { start: Fraction; end: Fraction }>();
  for (const { id, after, notBefore, work, wait } of ordered.value) {
    const start = latest(
      after.map((other) => early.get(other)?.end ?? ZERO),
      notBefore,
    );
    early.set(id, { start, end: clock.after(start, work).add(wait) });
  }
  const end = latest(
    [...early.values()].map((times) => times.end),
    ZERO,
  );
  const late = new Map<string, { start: Fraction; end: Fraction }>();
  for (const { id, work, wait } of [...ordered.value].reverse()) {
    const followers = stages.filter(({ after }) => after.includes(id));
    const latestEnd = earliest(
      followers.map((follower) => late.get(follower.id)?.start ?? end),
      end,
    );
    late.set(id, { start: clock.before(latestEnd.sub(wait), work), end: latestEnd });
  }
  const times = ordered.value.map(({ id, work, wait }) => {
    const [first, last] = [early.get(id), late.get(id)];
    if (first === undefined || last === undefined) throw new RangeError('Every stage has its times.');
    // Days without shop hours at either end are no slack: the work could not begin in them.
    const began = clock.before(first.end.sub(wait), work);
    const slack = latest([last.start.sub(latest([began], first.start))], ZERO);
    return {
      id,
      earliestStart: first.start,
      earliestEnd: first.end,
      latestStart: last.start,
      latestEnd: last.end,
      slack,
      critical: slack.equals(0),
    };
  });
  const critical = times.filter((stage) => stage.critical).map(({ id }) => id);
  return right({
    end,
    stages: times,
    critical,
    variance: varianceOf(ordered.value, new Set(critical), early),
  });
}

/** The largest variance of a chain of critical stages that leads to each, stage by stage. */
function varianceOf(
  ordered: readonly ScheduledStage[],
  critical: ReadonlySet<string>,
  early: ReadonlyMap<string, { start: Fraction; end: Fraction }>,
): Fraction {
  const sums = new Map<string, Fraction>();
  for (const { id, after, variance } of ordered) {
    if (!critical.has(id)) continue;
    const start = early.get(id)?.start ?? ZERO;
    const led = after.filter((other) => critical.has(other) && early.get(other)?.end.equals(start) === true);
    sums.set(
      id,
      variance.add(
        latest(
          led.map((other) => sums.get(other) ?? ZERO),
          ZERO,
        ),
      ),
    );
  }
  return latest([...sums.values()], ZERO);
}
