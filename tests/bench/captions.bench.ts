import { type Cue } from '../../src/domain/captions/cue.ts';
import { type ListedPart } from '../../src/domain/findings/finding.ts';
import { readFindings } from '../../src/domain/findings/read-findings.ts';
import { type Bench, formatTable, median } from './support/bench.ts';

const ROUNDS = 3;
/** Captions of about four seconds, and parts: a quarter of an hour, an hour, four hours; and four lists for an hour. */
const SIZES = [
  [225, 300],
  [900, 300],
  [3600, 300],
  [900, 75],
  [900, 1200],
] as const;
const HOUR = 1;
/** The most an hour against 300 parts may take, and what four times the captions or parts may take of the time of once. */
const MOST_MS = 1000;
const MOST_GROWTH = 5;

const FIRST =
  'base end side long drum motor bearing front rear upper lower inner outer slide pivot press guide chain'.split(
    ' ',
  );
const SECOND =
  'rail plate block housing bracket shaft beam collar flange bar cover guard arm frame lug wheel pin'.split(
    ' ',
  );

function someParts(count: number): ListedPart[] {
  return Array.from({ length: count }, (_none, index) => ({
    number: String(100 + index),
    name: `${FIRST[index % FIRST.length] ?? ''} ${SECOND[Math.floor(index / FIRST.length) % SECOND.length] ?? ''}`,
    aliases: [],
  }));
}

const SPOKEN = [
  'so the %s goes in next and it is forty by forty by three box cut at',
  'fourteen hundred and twenty which is about fifty six inches and i have the',
  'welder on a hundred and fifteen amps with the seventy eighteens out of the oven',
  'mind your fingers when it closes and never ever feel for a leak with your hand',
  'that is part one %n on the list and the drawing says two mil but i used three',
  'and honestly my neighbour came by for a cup of tea and told me about his boat',
];

function someCaptions(count: number): Cue[] {
  return Array.from({ length: count }, (_none, index) => {
    const line = (SPOKEN[index % SPOKEN.length] ?? '')
      .replace(
        '%s',
        `${FIRST[(index * 7) % FIRST.length] ?? ''} ${SECOND[(index * 5) % SECOND.length] ?? ''}`,
      )
      .replace('%n', ['oh four', 'twenty one', 'one nine'][index % 3] ?? '');
    return { start: index * 4000, end: index * 4000 + 3900, lines: [line] };
  });
}

function measure([captions, parts]: (typeof SIZES)[number]): number {
  const [cues, list] = [someCaptions(captions), someParts(parts)];
  const times = Array.from({ length: ROUNDS }, () => {
    const startedAt = performance.now();
    readFindings(cues, list);
    return performance.now() - startedAt;
  });
  return median(times);
}

/** What it costs to read captions into findings, and how that grows with captions and with parts. */
export const bench: Bench = {
  name: 'captions',
  what: `captions read into findings, in milliseconds; ${String(MOST_MS)} at most for an hour and 300 parts`,
  run(print) {
    measure(SIZES[0]);
    const times = SIZES.map(measure);
    const rows = SIZES.map(([captions, parts], index) => [captions, parts, (times[index] ?? 0).toFixed(0)]);
    for (const line of formatTable([['captions', 'parts', 'read'], ...rows])) print(line);
    const [quarter = 0, hour = 0, four = 0, few = 0, many = 0] = times;
    const growth = [hour / quarter, four / hour, hour / few, many / hour];
    print(`\nFour times the captions take ${growth.slice(0, 2).map(show).join(' and ')} times as long.`);
    print(`Four times the parts take ${growth.slice(2).map(show).join(' and ')} times as long.`);
    const good = (times[HOUR] ?? Number.POSITIVE_INFINITY) <= MOST_MS;
    return Promise.resolve(good && growth.every((factor) => factor <= MOST_GROWTH));
  },
};

function show(factor: number): string {
  return factor.toFixed(1);
}
