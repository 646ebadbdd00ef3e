import { formatClock } from '../time/format-clock.ts';
import { type Chapter } from './chapter.ts';

/** The forms that chapters are written in. */
export const CHAPTER_FORMS = ['text', 'vtt', 'json', 'ffmetadata', 'podlove'] as const;
export type ChapterForm = (typeof CHAPTER_FORMS)[number];

/** A title on one line. */
function lineOf(title: string): string {
  return title.replace(/\s+/gu, ' ').trim();
}

/** 00:03:05.000: hours always written, milliseconds always three digits. */
function timestamp(milliseconds: number): string {
  const pad = (number: number, length = 2) => String(number).padStart(length, '0');
  const seconds = Math.floor(milliseconds / 1000);
  const [hours, minutes] = [Math.floor(seconds / 3600), Math.floor((seconds % 3600) / 60)];
  return `${pad(hours)}:${pad(minutes)}:${pad(seconds % 60)}.${pad(milliseconds % 1000, 3)}`;
}

/** Each chapter with its end: where the next one begins, or the video ends. */
function withEnds(chapters: readonly Chapter[], length: number): (Chapter & { readonly end: number })[] {
  return chapters.map((chapter, index) => ({ ...chapter, end: chapters[index + 1]?.start ?? length }));
}

/**
 * Lines for the text that goes with a video: 0:00 Drum shaft. Hosts read whole seconds; a chapter is written at the
 * second that it begins in. Common practice of video hosts.
 */
export function writeChapterText(chapters: readonly Chapter[]): string {
  return chapters.map(({ start, title }) => `${formatClock(start / 1000)} ${lineOf(title)}\n`).join('');
}

/**
 * A WebVTT chapters track: one cue a chapter, none inside another.
 * Source: W3C WebVTT, chapter title text and chapter cues.
 * @param length of the video in whole milliseconds
 */
export function writeChapterVtt(chapters: readonly Chapter[], length: number): string {
  const cues = withEnds(chapters, length).map(({ start, end, title }) => {
    const text = lineOf(title).replaceAll('-->', '→').replaceAll('&', '&amp;').replaceAll('<', '&lt;');
    return `${timestamp(start)} --> ${timestamp(end)}\n${text.replaceAll('>', '&gt;')}\n`;
  });
  return ['WEBVTT\n', ...cues].join('\n');
}

/** Chapters as podcast players read them. */
export interface JsonChapters {
  readonly version: '1.2.0';
  readonly chapters: readonly { readonly startTime: number; readonly title: string }[];
}

/** Podcasting 2.0 chapters. Source: podcast-namespace, jsonChapters.md, version 1.2; starts in seconds. */
export function toJsonChapters(chapters: readonly Chapter[]): JsonChapters {
  return {
    version: '1.2.0',
    chapters: chapters.map(({ start, title }) => ({ startTime: start / 1000, title: lineOf(title) })),
  };
}

/**
 * Chapters for a muxer. Source: FFmpeg, doc/metadata.texi: = ; # \ and line ends are escaped; without a time base
 * the numbers would be nanoseconds, so it is always written.
 */
export function writeFfmetadata(chapters: readonly Chapter[], length: number): string {
  const blocks = withEnds(chapters, length).map(({ start, end, title }) => {
    const escaped = lineOf(title).replace(/[=;#\\]/g, '\\$&');
    return `[CHAPTER]\nTIMEBASE=1/1000\nSTART=${String(start)}\nEND=${String(end)}\ntitle=${escaped}\n`;
  });
  return [';FFMETADATA1\n', ...blocks].join('');
}

/** The characters that XML forbids, and those that it escapes. Source: W3C XML 1.0, 2.2 and 2.4. */
function xmlAttribute(text: string): string {
  return text
    .replace(/[^\t\n\r\u0020-\uD7FF\uE000-\uFFFD\u{10000}-\u{10FFFF}]/gu, '')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;');
}

/** Podlove Simple Chapters 1.2, to stand in a feed's item. Starts are normal play time. */
export function writePodloveChapters(chapters: readonly Chapter[]): string {
  const lines = chapters.map(
    ({ start, title }) =>
      `  <psc:chapter start="${timestamp(start)}" title="${xmlAttribute(lineOf(title))}"/>\n`,
  );
  return `<psc:chapters version="1.2" xmlns:psc="http://podlove.org/simple-chapters">\n${lines.join('')}</psc:chapters>\n`;
}
