import { type Cue, sortCues } from './cue.ts';

/** @throws RangeError for a caption that no file may hold: readCaptions gives none such */
function requireWritable({ start, end }: Cue): void {
  if (!Number.isSafeInteger(start) || !Number.isSafeInteger(end) || start < 0 || end <= start)
    throw new RangeError(`A caption from ${String(start)} to ${String(end)} ms cannot be written.`);
}

function timestamp(milliseconds: number, separator: '.' | ','): string {
  const pad = (number: number, length = 2) => String(number).padStart(length, '0');
  const seconds = Math.floor(milliseconds / 1000);
  const [hours, minutes] = [Math.floor(seconds / 3600), Math.floor((seconds % 3600) / 60)];
  return `${pad(hours)}:${pad(minutes)}:${pad(seconds % 60)}${separator}${pad(milliseconds % 1000, 3)}`;
}

/** Lines that neither end a caption early nor pass for a timing. */
function safeLines(lines: readonly string[]): string[] {
  return lines
    .flatMap((line) => line.split(/\r\n|\r|\n/))
    .map((line) => line.replaceAll('\0', '\uFFFD').replaceAll('-->', '→').trim())
    .filter((line) => line !== '');
}

function escapeText(text: string): string {
  return text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;');
}

/** A name inside a voice tag, where neither line ends nor > may stand (W3C WebVTT, 4.2.2). */
function escapeVoice(voice: string): string {
  return escapeText(safeLines([voice]).join(' '));
}

/**
 * Captions as conforming WebVTT: sorted, numbered, escaped, without settings or styles.
 * Source: W3C WebVTT, sections 4.1 and 4.2. “-->” in words becomes an arrow, since no payload may hold it.
 */
export function writeWebvtt(cues: readonly Cue[]): string {
  const blocks = sortCues(cues).map((cue, index) => {
    requireWritable(cue);
    const words = safeLines(cue.lines).map(escapeText).join('\n');
    const spoken = cue.voice === undefined ? words : `<v ${escapeVoice(cue.voice)}>${words}</v>`;
    return `${String(index + 1)}\n${timestamp(cue.start, '.')} --> ${timestamp(cue.end, '.')}\n${spoken}\n`;
  });
  return ['WEBVTT\n', ...blocks].join('\n');
}

/**
 * Captions as SubRip: sorted, numbered from 1, hours always written, in plain text. Who speaks stands before the
 * words, as podcast transcripts have it (podcast namespace, transcripts.md).
 */
export function writeSubrip(cues: readonly Cue[]): string {
  const blocks = sortCues(cues).map((cue, index) => {
    requireWritable(cue);
    const words = safeLines(cue.lines).join('\n');
    const spoken = cue.voice === undefined ? words : `${safeLines([cue.voice]).join(' ')}: ${words}`;
    return `${String(index + 1)}\n${timestamp(cue.start, ',')} --> ${timestamp(cue.end, ',')}\n${spoken}\n`;
  });
  return blocks.join('\n');
}
