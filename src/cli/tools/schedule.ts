import Fraction from 'fraction.js';
import { z } from 'zod';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import {
  findCriticalPath,
  fromThreeGuesses,
  type ScheduledStage,
} from '../../domain/schedule/critical-path.ts';
import { PLAIN_CLOCK, shopClock, type WeekHours } from '../../domain/schedule/shop-calendar.ts';
import { readArguments } from '../read-arguments.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE =
  'schedule stages.json   ({"start":"2026-03-02","hours":[0,0,4,0,0,6,0],"stages":[{"id":"frame","work":12,"after":[],"wait":2,"notBefore":"2026-03-09"}]}; work is a number or [least, likely, most]; without start and hours everything is in one unit)';

const amount = z
  .number('Work and waits are numbers.')
  .min(0, 'Work and waits are not below zero.')
  .max(100_000, 'Work and waits are at most 100000.');
const day = z.iso.date('A date is written 2026-03-02.');
const ScheduleRequest = z.object({
  start: day.optional(),
  hours: z
    .array(z.number().min(0).max(24), 'hours are those of seven days, Monday first.')
    .length(7, 'hours are those of seven days, Monday first.')
    .optional(),
  stages: z
    .array(
      z.object({
        id: z.string('Each stage has an id.').min(1, 'Each stage has an id.'),
        work: z.union(
          [amount, z.tuple([amount, amount, amount])],
          'work is a number, or least, likely and most.',
        ),
        after: z.array(z.string()).default([]),
        wait: amount.default(0),
        notBefore: z.union([day, amount], 'notBefore is a date, or a number without a start.').optional(),
      }),
      'Give the stages as a list.',
    )
    .min(1, 'There are no stages in the list.')
    .max(2000, 'A schedule takes at most 2000 stages.'),
});
type Asked = z.output<typeof ScheduleRequest>;

const DAY = 86_400_000;
const dayNumber = (date: string) => Date.parse(`${date}T00:00:00Z`) / DAY;
/** 1 January 1970 was a Thursday. */
const weekdayOf = (number: number) => (((number + 3) % 7) + 7) % 7;
const fraction = (value: number) => new Fraction(value).simplify(1e-9);

function readStages({ stages, start }: Asked): Answer<readonly ScheduledStage[]> {
  const read: ScheduledStage[] = [];
  for (const { id, work, after, wait, notBefore = 0 } of stages) {
    if ((typeof notBefore === 'string') !== (start !== undefined) && notBefore !== 0)
      return wrong(`${id}: notBefore is a date when there is a start, and a number otherwise.`);
    const guesses = typeof work === 'number' ? ([work, work, work] as const) : work;
    const [least, likely, most] = guesses;
    if (least > likely || likely > most) return wrong(`${id}: least, likely and most have to rise.`);
    const since =
      typeof notBefore === 'string' ? dayNumber(notBefore) - dayNumber(start ?? notBefore) : notBefore;
    read.push({
      id,
      ...fromThreeGuesses(fraction(least), fraction(likely), fraction(most)),
      after: [...new Set(after)],
      wait: fraction(wait),
      notBefore: fraction(Math.max(0, since)),
    });
  }
  return right(read);
}

function run(asked: Asked): Answer<unknown> {
  const { start, hours } = asked;
  if ((start === undefined) !== (hours === undefined))
    return wrong('Give start and hours together, or neither.');
  if (hours?.every((count) => count === 0) === true) return wrong('A week needs some shop hours.');
  const stages = readStages(asked);
  if (!stages.ok) return stages;
  const first = start === undefined ? null : dayNumber(start);
  const week = hours?.map(fraction) as unknown as WeekHours | undefined;
  const clock = first === null || week === undefined ? PLAIN_CLOCK : shopClock(week, weekdayOf(first));
  const path = findCriticalPath(stages.value, clock);
  if (!path.ok) return path;
  const { end, critical, variance } = path.value;
  // A stage that ends with a day ends on it, not at the next day's midnight.
  const dateOf = (moment: Fraction, ends: boolean) =>
    new Date(
      ((first ?? 0) + Number((ends ? moment.ceil().sub(moment.gt(0) ? 1 : 0) : moment.floor()).valueOf())) *
        DAY,
    )
      .toISOString()
      .slice(0, 10);
  return right({
    end: end.valueOf(),
    ...(first === null ? {} : { endDate: dateOf(end, true) }),
    critical,
    variance: variance.valueOf(),
    deviation: Math.sqrt(variance.valueOf()),
    stages: path.value.stages.map((stage) => ({
      id: stage.id,
      earliestStart: stage.earliestStart.valueOf(),
      earliestEnd: stage.earliestEnd.valueOf(),
      latestStart: stage.latestStart.valueOf(),
      latestEnd: stage.latestEnd.valueOf(),
      slack: stage.slack.valueOf(),
      critical: stage.critical,
      ...(first === null
        ? {}
        : {
            earliestStartDate: dateOf(stage.earliestStart, false),
            earliestEndDate: dateOf(stage.earliestEnd, true),
            latestStartDate: dateOf(stage.latestStart, false),
            latestEndDate: dateOf(stage.latestEnd, true),
          }),
    })),
  });
}

function parseJson(text: string): Answer<Record<string, unknown>> {
  try {
    const parsed: unknown = JSON.parse(text);
    if (Array.isArray(parsed)) return right({ stages: parsed });
    return typeof parsed === 'object' && parsed !== null
      ? right(parsed as Record<string, unknown>)
      : wrong('The file holds no stages.');
  } catch {
    return wrong('The file is no JSON.');
  }
}

/** Earliest and latest moments of stages, as dates where there is a start, and the critical chain. */
export const scheduleTool: Tool = {
  usage: USAGE,
  fromArguments: (args, read) => {
    const found = readArguments(args, {}, USAGE);
    if (!found.ok) return found;
    const [path, ...more] = found.value.bare;
    if (path === undefined || more.length > 0) return wrong(`Give one list of stages. Usage: ${USAGE}`);
    const text = read(path);
    return text.ok ? parseJson(text.value) : text;
  },
  run: (request) => {
    const asked = readRequest(ScheduleRequest, request);
    return asked.ok ? run(asked.value) : asked;
  },
};
