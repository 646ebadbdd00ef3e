import { type Answer, right, wrong } from '../answer.ts';
import { formatClock } from '../time/format-clock.ts';
import { CAPTIONS_LIMITS, type Cue, sortCues } from './cue.ts';
import { decodeText } from './decode-text.ts';
import { readSubrip } from './read-subrip.ts';
import { readWebvtt } from './read-webvtt.ts';
import { type CaptionsFormat, sniffCaptions } from './sniff-captions.ts';

/** What was read from a captions file. */
export interface Captions {
  readonly format: CaptionsFormat;
  /** Sorted; each has words and ends after it starts. */
  readonly cues: readonly Cue[];
  /** What was guessed or left out, as sentences. */
  readonly warnings: readonly string[];
}

/**
 * Reads a captions file, WebVTT or SubRip, whichever its content is.
 * @param bytes as uploaded, in any of the encodings that decodeText knows
 */
export function readCaptions(bytes: Uint8Array): Answer<Captions> {
  if (bytes.length > CAPTIONS_LIMITS.bytes)
    return wrong('This captions file is too large: 4 MiB is the most.');
  const decoded = decodeText(bytes);
  const read = readCaptionsText(decoded.text);
  if (!read.ok || decoded.encoding !== 'windows-1252') return read;
  const guess =
    'The file is not in UTF-8. It was read as Windows-1252: look over letters with accents before you publish.';
  return right({ ...read.value, warnings: [guess, ...read.value.warnings] });
}

/** Reads the text of a captions file; what is said of readCaptions holds here too. */
export function readCaptionsText(text: string): Answer<Captions> {
  const read = readAllCues(text);
  return read.ok ? keepGood(read.value.cues, read.value.format) : read;
}

/** Every caption of a file in its own order, of any number and length; some may have no words or end before they begin. */
export function readAllCues(text: string): Answer<Pick<Captions, 'format' | 'cues'>> {
  const bare = text.startsWith('\uFEFF') ? text.slice(1) : text;
  if (bare.trim() === '') return wrong('This captions file is empty.');
  const format = sniffCaptions(bare);
  if (format === null)
    return wrong('This is not a captions file: it neither begins with WEBVTT nor has SubRip times in it.');
  const read = format === 'webvtt' ? readWebvtt(bare) : right(readSubrip(bare));
  return read.ok ? right({ format, cues: read.value }) : read;
}

function keepGood(all: readonly Cue[], format: CaptionsFormat): Answer<Captions> {
  if (all.length > CAPTIONS_LIMITS.cues)
    return wrong(
      `This file holds ${String(all.length)} captions; ${String(CAPTIONS_LIMITS.cues)} are the most.`,
    );
  const forward = all.filter((cue) => cue.end > cue.start);
  const worded = forward.filter((cue) => cue.lines.length > 0);
  const long = worded.find((cue) => cue.lines.join('\n').length > CAPTIONS_LIMITS.cueCharacters);
  if (long !== undefined)
    return wrong(
      `The caption at ${formatClock(long.start / 1000)} is longer than ${String(CAPTIONS_LIMITS.cueCharacters)} characters.`,
    );
  if (worded.length === 0) return wrong('There are no captions in this file.');
  const warnings = [
    ...sayLeftOut(all.length - forward.length, 'ended before it began', 'ended before they began'),
    ...sayLeftOut(forward.length - worded.length, 'had no words', 'had no words'),
  ];
  return right({ format, cues: sortCues(worded), warnings });
}

function sayLeftOut(count: number, one: string, many: string): string[] {
  if (count === 0) return [];
  return [
    count === 1
      ? `One caption ${one} and was left out.`
      : `${String(count)} captions ${many} and were left out.`,
  ];
}
