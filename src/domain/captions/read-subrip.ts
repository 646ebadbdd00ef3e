import { type Cue } from './cue.ts';

/**
 * SubRip has no standard. What files in the wild need is tolerated: a full stop for the comma, missing or wrong
 * numbers, several blank lines or none before the next timing, coordinates after the times, simple tags.
 * Source: subtitles.md of the Matroska specification (IETF cellar) for the form; the tolerance is common practice.
 */
const TIMING =
  /^\s*(\d{1,3}):(\d{1,2}):(\d{1,2})[,.](\d{1,3})\s*-->\s*(\d{1,3}):(\d{1,2}):(\d{1,2})[,.](\d{1,3})(?=\s|$)/;

/** Tags that players know, and the override blocks that other programs leave behind. */
const MARKUP = /<\/?(?:b|i|u|s|font)(?:\s[^<>]{0,100})?>|\{\\[^{}]{0,100}\}/gi;

const NUMBER = /^\s*\d{1,7}\s*$/;

/**
 * The captions of a SubRip text, in the order of the file: some may be empty, or end before they start.
 * @param text without a byte order mark, with any line ends
 */
export function readSubrip(text: string): Cue[] {
  const lines = text.replaceAll('\0', '\uFFFD').split(/\r\n|\r|\n/);
  const timings = lines.flatMap((line, index) => {
    const times = readTiming(line);
    return times === null ? [] : [{ index, times }];
  });
  return timings.map(({ index, times }, place) => {
    const next = timings[place + 1]?.index;
    const block = lines.slice(index + 1, next === undefined ? undefined : withoutNumber(lines, next));
    return { ...times, lines: wordsOf(block) };
  });
}

function readTiming(line: string): Pick<Cue, 'start' | 'end'> | null {
  const found = TIMING.exec(line);
  if (found === null) return null;
  const [, ...digits] = found;
  const [start, end] = [digits.slice(0, 4), digits.slice(4)].map(([hours, minutes, seconds, part]) => {
    // 1,5 is read as players read it: five milliseconds are written ,005.
    const milliseconds = Number((part ?? '0').padEnd(3, '0'));
    return ((Number(hours) * 60 + Number(minutes)) * 60 + Number(seconds)) * 1000 + milliseconds;
  }) as [number, number];
  return { start, end };
}

/** The line of the next timing, or of the number that stands before it. */
function withoutNumber(lines: readonly string[], timing: number): number {
  return NUMBER.test(lines[timing - 1] ?? '') ? timing - 1 : timing;
}

function wordsOf(block: readonly string[]): string[] {
  return block.map((line) => line.replace(MARKUP, '').trim()).filter((line) => line !== '');
}
