import { type Cue } from '../captions/cue.ts';
import { readSpeech } from '../findings/speech/read-speech.ts';
import { type Word } from '../findings/speech/speech.ts';
import { matchWords, type WordPair } from './match-words.ts';

/** Whole milliseconds from the start of a video, half-open. */
export interface Span {
  readonly in: number;
  readonly out: number;
}

/** A stretch of the version before, and the stretch of the new one, as long, that says the same. */
export interface AlignedStretch {
  readonly before: Span;
  readonly now: Span;
}

/** A stretch of the version before that was not found in the new one. */
export interface UnalignedStretch extends Span {
  /** Its first words; empty where nobody speaks. */
  readonly said: string;
}

/** How two versions of an episode lie on each other. */
export interface Alignment {
  /** In the order of the new version; none overlap in either. */
  readonly aligned: readonly AlignedStretch[];
  /** In the order of the version before. */
  readonly unaligned: readonly UnalignedStretch[];
}

/** One version of an episode. */
export interface SpokenVersion {
  readonly cues: readonly Cue[];
  /** How long its video is, in milliseconds; null until known: then it ends with its last caption. */
  readonly length: number | null;
}

/** Equal words in a row that are believed, unless they are a whole caption. Our own: shorter ones are said again and again. */
const LEAST_WORDS = 4;
/** The same where a passage stands in another order than before. Our own: chance finds more there. */
const LEAST_WORDS_MOVED = 8;
/** Seconds by which words may be off and still lie at one offset. Our own: what sharing out a caption's time is off by. */
const SAME_OFFSET = 0.5;
/** Words that differ between two stretches at one offset which still are one. Our own: a sentence spoken anew. */
const MOST_WORDS_BETWEEN = 20;
/** Passages that were moved are looked for so often in what is left. */
const MOST_PASSES = 8;
/** A silence shorter than this is not told, in milliseconds. Our own: notes beside it snap to what is aligned. */
const LEAST_TOLD = 1000;
const WORDS_TOLD = 12;

/** Words in a row, from `a` in the version before and from `b` in the new one. */
interface Run extends WordPair {
  readonly count: number;
}

/**
 * Lays the captions of a new version of an episode on those of the version before, by the words that they share. A
 * stretch keeps its speed. Words that were corrected do not break one; a passage that was moved is found again.
 */
export function alignCaptions(before: SpokenVersion, now: SpokenVersion): Alignment {
  const [old, next] = [readSpeech(before.cues).words, readSpeech(now.cues).words];
  const lengths = { before: lengthOf(before), now: lengthOf(now) };
  const groups = joinRuns(old, next, findRuns(old, next));
  const stretches = groups.map((runs) => stretchOf(old, next, runs, lengths));
  const apart = dropOverlaps(
    dropOverlaps(stretches, ({ before: span }) => span),
    ({ now: span }) => span,
  );
  return { aligned: apart, unaligned: listUnaligned(old, apart, lengths.before) };
}

function lengthOf({ cues, length }: SpokenVersion): number {
  return cues.reduce((most, { end }) => Math.max(most, end), length ?? 0);
}

function findRuns(old: readonly Word[], next: readonly Word[]): Run[] {
  const runs: Run[] = [];
  const [takenA, takenB] = [new Set<number>(), new Set<number>()];
  for (let pass = 0; pass < MOST_PASSES; pass++) {
    const a = leftOf(old, takenA, 'a');
    const b = leftOf(next, takenB, 'b');
    const pairs = matchWords(a.texts, b.texts).map((pair) => ({
      a: a.at[pair.a] ?? 0,
      b: b.at[pair.b] ?? 0,
    }));
    const found = cutRuns(old, next, pairs).filter((run) =>
      pass === 0
        ? run.count >= LEAST_WORDS || (isWholeCaption(old, run.a, run) && isWholeCaption(next, run.b, run))
        : run.count >= LEAST_WORDS_MOVED,
    );
    if (found.length === 0) break;
    for (const { a: fromA, b: fromB, count } of found)
      for (let index = 0; index < count; index++) {
        takenA.add(fromA + index);
        takenB.add(fromB + index);
      }
    runs.push(...found);
  }
  return runs;
}

/** The words that are not taken yet; between those that are not neighbours stands one that the other side has nowhere. */
function leftOf(words: readonly Word[], taken: ReadonlySet<number>, side: string) {
  const [texts, at]: [string[], number[]] = [[], []];
  for (const [index, { text }] of words.entries()) {
    if (taken.has(index)) continue;
    if (index > 0 && taken.has(index - 1)) {
      texts.push(`\0${side}${String(index)}`);
      at.push(-1);
    }
    texts.push(text);
    at.push(index);
  }
  return { texts, at };
}

/** Pairs as runs, cut where the offset jumps too: a silence was cut out there, or put in. */
function cutRuns(old: readonly Word[], next: readonly Word[], pairs: readonly WordPair[]): Run[] {
  const runs: { a: number; b: number; count: number; offsets: number }[] = [];
  for (const { a, b } of pairs) {
    const offset = offsetOf(old, next, { a, b });
    const last = runs.at(-1);
    const goesOn =
      last !== undefined &&
      a === last.a + last.count &&
      b === last.b + last.count &&
      Math.abs(offset - last.offsets / last.count) <= SAME_OFFSET;
    if (goesOn) {
      last.count += 1;
      last.offsets += offset;
    } else runs.push({ a, b, count: 1, offsets: offset });
  }
  return runs;
}

function offsetOf(old: readonly Word[], next: readonly Word[], { a, b }: WordPair): number {
  return (next[b]?.start ?? 0) - (old[a]?.start ?? 0);
}

function isWholeCaption(words: readonly Word[], from: number, { count }: Run): boolean {
  const [first, last] = [words[from]?.cue, words[from + count - 1]?.cue];
  return words[from - 1]?.cue !== first && words[from + count]?.cue !== last;
}

/** Runs that follow each other in both versions at one offset, with little between them. */
function joinRuns(old: readonly Word[], next: readonly Word[], runs: readonly Run[]): Run[][] {
  const order = new Map([...runs].sort((x, y) => x.b - y.b).map((run, index) => [run, index]));
  const groups: Run[][] = [];
  for (const run of [...runs].sort((x, y) => x.a - y.a)) {
    const group = groups.at(-1);
    const [first, last] = [group?.[0], group?.at(-1)];
    const joins =
      group !== undefined &&
      first !== undefined &&
      last !== undefined &&
      order.get(run) === (order.get(last) ?? 0) + 1 &&
      Math.max(run.a - last.a, run.b - last.b) - last.count <= MOST_WORDS_BETWEEN &&
      Math.abs(middleOffset(old, next, [run]) - middleOffset(old, next, [first])) <= SAME_OFFSET;
    if (joins) group.push(run);
    else groups.push([run]);
  }
  return groups;
}

/** The median of the offsets of all words, in seconds. */
function middleOffset(old: readonly Word[], next: readonly Word[], runs: readonly Run[]): number {
  const offsets = runs
    .flatMap(({ a, b, count }) =>
      Array.from({ length: count }, (_none, index) => offsetOf(old, next, { a: a + index, b: b + index })),
    )
    .sort((x, y) => x - y);
  return offsets[offsets.length >> 1] ?? 0;
}

function stretchOf(
  old: readonly Word[],
  next: readonly Word[],
  runs: readonly Run[],
  lengths: { readonly before: number; readonly now: number },
): AlignedStretch {
  const [first, last] = [runs[0], runs.at(-1)];
  const offset = Math.round(middleOffset(old, next, runs) * 1000);
  const [begin, end] = [first?.a ?? 0, last === undefined ? 0 : last.a + last.count];
  let from = Math.round((old[begin]?.start ?? 0) * 1000);
  let to = Math.round((old[end - 1]?.end ?? 0) * 1000);
  // The silence before the first word and after the last can only go with them.
  if (begin === 0 && first?.b === 0) from = 0;
  if (end === old.length && last !== undefined && last.b + last.count === next.length) to = lengths.before;
  from = Math.max(from, 0, -offset);
  to = Math.min(to, lengths.before, lengths.now - offset);
  return { before: { in: from, out: to }, now: { in: from + offset, out: to + offset } };
}

/** Stretches in the order of one version, each shortened at its start by what the one before it takes. */
function dropOverlaps(
  stretches: readonly AlignedStretch[],
  spanOf: (stretch: AlignedStretch) => Span,
): AlignedStretch[] {
  let done = 0;
  return [...stretches]
    .sort((a, b) => spanOf(a).in - spanOf(b).in)
    .flatMap((stretch) => {
      const by = Math.max(0, done - spanOf(stretch).in);
      const { before, now } = stretch;
      if (before.out - before.in <= by) return [];
      done = spanOf(stretch).out;
      return [{ before: { ...before, in: before.in + by }, now: { ...now, in: now.in + by } }];
    });
}

function listUnaligned(
  old: readonly Word[],
  aligned: readonly AlignedStretch[],
  length: number,
): UnalignedStretch[] {
  const spans = aligned.map(({ before }) => before).sort((a, b) => a.in - b.in);
  const edges = [0, ...spans.flatMap((span) => [span.in, span.out]), length];
  const gaps: UnalignedStretch[] = [];
  for (let index = 0; index < edges.length; index += 2) {
    const gap = { in: edges[index] ?? 0, out: edges[index + 1] ?? 0 };
    const words = old.filter(({ start, end }) => start * 1000 >= gap.in - 1 && end * 1000 <= gap.out + 1);
    const said = words
      .slice(0, WORDS_TOLD)
      .map(({ text }) => text)
      .join(' ');
    if (gap.out - gap.in >= LEAST_TOLD || (said !== '' && gap.out > gap.in))
      gaps.push({ ...gap, said: words.length > WORDS_TOLD ? `${said} …` : said });
  }
  return gaps;
}
