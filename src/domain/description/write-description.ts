import { type Chapter } from '../chapters/chapter.ts';
import { writeChapterText } from '../chapters/write-chapters.ts';
import { formatClock } from '../time/format-clock.ts';

/** What the text that goes with a video may say. */
export interface Description {
  /** What the episode is about, as paragraphs. */
  readonly about: string;
  readonly chapters: readonly Chapter[];
  readonly parts: readonly { readonly number: string; readonly name: string }[];
  /** The first one is the episode's own page. */
  readonly links: readonly { readonly label: string; readonly address: string }[];
  /** At whole milliseconds from the start of the video. */
  readonly corrections: readonly { readonly at: number; readonly text: string }[];
  readonly cautions: readonly { readonly label: string; readonly words: string }[];
  readonly terms: string;
}

/** The length that video hosts take. Common practice of such hosts, in characters. */
export const USUAL_DESCRIPTION_LENGTH = 5000;

/** The blocks in the order of the text. */
const BLOCKS = ['about', 'chapters', 'cautions', 'corrections', 'links', 'parts', 'terms'] as const;
type Block = (typeof BLOCKS)[number];

const HEADS: Readonly<Record<Block, string>> = {
  about: '',
  chapters: 'Chapters',
  cautions: 'Take care',
  corrections: 'Corrections',
  links: 'Links',
  parts: 'Parts',
  terms: '',
};

/**
 * Blocks from the least important on: what can hurt somebody, or was said wrong, leaves last. The episode's page, which
 * has all of it, stays longer than what it says again.
 */
const DROPPED: readonly (Block | 'page')[] = [
  'parts',
  'links',
  'about',
  'chapters',
  'page',
  'terms',
  'corrections',
  'cautions',
];

const WORDS: Readonly<Record<Block | 'page', readonly [one: string, many: string]>> = {
  about: ['a line of what it is about', 'lines of what it is about'],
  chapters: ['the chapters', 'the chapters'],
  cautions: ['a caution', 'cautions'],
  corrections: ['a correction', 'corrections'],
  links: ['a link', 'links'],
  page: ['the link to its page', 'the link to its page'],
  parts: ['a part', 'parts'],
  terms: ['the terms', 'the terms'],
};

interface Line {
  readonly block: Block;
  readonly text: string;
  /** Which of `DROPPED` it goes with. */
  readonly goes: Block | 'page';
}

function oneLine(text: string): string {
  return text.replace(/\s+/gu, ' ').trim();
}

function linesOf(description: Description): Line[] {
  const { about, chapters, parts, links, corrections, cautions, terms } = description;
  const line = (block: Block, text: string, goes: Block | 'page' = block): Line => ({ block, text, goes });
  return [
    ...about.split(/\n+/).map((text) => line('about', oneLine(text))),
    // All or none: a list that lacks its last chapters says something wrong of the one before.
    line('chapters', writeChapterText(chapters).trimEnd()),
    ...cautions.map(({ label, words }) => line('cautions', oneLine(`${label}: ${words}`))),
    ...corrections.map(({ at, text }) => line('corrections', oneLine(`${formatClock(at / 1000)} ${text}`))),
    ...links.map(({ label, address }, index) =>
      line('links', oneLine(`${label}: ${address}`), index === 0 ? 'page' : 'links'),
    ),
    ...parts.map(({ number, name }) => line('parts', oneLine(`${number} ${name}`))),
    line('terms', oneLine(terms)),
  ].filter(({ text }) => text !== '');
}

function render(lines: readonly Line[]): string {
  return BLOCKS.flatMap((block) => {
    const own = lines.filter((line) => line.block === block).map(({ text }) => text);
    if (own.length === 0) return [];
    return [[...(HEADS[block] === '' ? [] : [HEADS[block]]), ...own].join('\n')];
  }).join('\n\n');
}

/** Characters as people count them: one that takes two places in memory is one. */
function lengthOf(text: string): number {
  return [...text].length;
}

/**
 * The text that goes with a video, in whole lines: where it would be too long, the least important lines go first, of
 * a block the last ones first.
 * @param length how many characters it may have
 * @returns the text, and what was left out of it as sentences
 */
export function writeDescription(
  description: Description,
  length: number,
): { readonly text: string; readonly leftOut: readonly string[] } {
  const lines = linesOf(description);
  const rank = (line: Line) => DROPPED.indexOf(line.goes);
  // The line that goes first stands first.
  const going = lines
    .map((line, index) => ({ line, index }))
    .sort((a, b) => rank(a.line) - rank(b.line) || b.index - a.index)
    .map(({ line }) => line);
  const without = (count: number) => {
    const gone = new Set(going.slice(0, count));
    return render(lines.filter((line) => !gone.has(line)));
  };
  let [low, high] = [0, going.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if (lengthOf(without(middle)) <= length) high = middle;
    else low = middle + 1;
  }
  return { text: without(low), leftOut: sayLeftOut(going.slice(0, low), lines) };
}

function sayLeftOut(gone: readonly Line[], all: readonly Line[]): string[] {
  return DROPPED.flatMap((kind) => {
    const count = gone.filter(({ goes }) => goes === kind).length;
    if (count === 0) return [];
    const [one, many] = WORDS[kind];
    const of = all.filter(({ goes }) => goes === kind).length;
    const whole = kind === 'chapters' || kind === 'page' || kind === 'terms';
    if (whole || of === 1) return [`Left out: ${one}.`];
    return [`Left out: ${String(count)} of ${String(of)} ${many}.`];
  });
}
