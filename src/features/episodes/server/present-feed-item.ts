import { gatherCautions } from '../../../domain/cautions/gather-cautions.ts';
import { USUAL_CAUTIONS } from '../../../domain/cautions/usual-cautions.ts';
import { convertPlace } from '../../../domain/notes/convert-place.ts';
import { sortNotes } from '../../../domain/notes/note-place.ts';
import { formatClock } from '../../../domain/time/format-clock.ts';
import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { type Note } from '../../notes/note.ts';

/** Notes that one item of a feed tells; its page has them all. */
const MOST_NOTES = 60;

/**
 * The instant that a feed gives for an episode's day: noon UTC, which is that same day for nearly everyone
 * and needs no rules of any time zone; but never later than the publishing itself, for readers hold back
 * what has a date to come.
 * @param day as 2026-11-12
 */
export function feedInstant(day: string | null, publishedAt: Date): Date {
  const noon = day === null ? publishedAt : new Date(`${day}T12:00:00Z`);
  return noon < publishedAt ? noon : publishedAt;
}

const escapeHtml = (text: string) =>
  text.replaceAll('&', '&amp;').replaceAll('<', '&lt;').replaceAll('>', '&gt;').replaceAll('"', '&quot;');

/**
 * What a feed says of an episode, as HTML in which everything that was typed is plain text: what it is about, the
 * usual cautions, and its notes with links to their second.
 * @param link the page's whole address
 */
export function describeInFeed(about: string, notes: readonly Note[], rate: Rate, link: string): string {
  const placed = sortNotes(notes.map((note) => ({ ...note, ...convertPlace(note.position, rate) })));
  const paragraphs = about.split(/\n{2,}/).filter((paragraph) => paragraph.trim() !== '');
  const cautions = gatherCautions(placed).map(({ topic }) => {
    const { words, sources } = USUAL_CAUTIONS[topic];
    return `<li>${escapeHtml(`${words} (${sources.map(({ number }) => number).join(', ')})`)}</li>`;
  });
  const lines = placed.slice(0, MOST_NOTES).map(({ frame, text }) => {
    const seconds = frameToMilliseconds(frame, rate) / 1000;
    const at = `<a href="${escapeHtml(`${link}?t=${String(seconds)}`)}">${formatClock(seconds)}</a>`;
    return `<li>${at} ${escapeHtml(text)}</li>`;
  });
  const more = placed.length - lines.length;
  return [
    ...paragraphs.map((paragraph) => `<p>${escapeHtml(paragraph.trim()).replaceAll('\n', '<br>')}</p>`),
    cautions.length === 0 ? '' : `<p>Before you do this:</p><ul>${cautions.join('')}</ul>`,
    lines.length === 0 ? '' : `<ul>${lines.join('')}</ul>`,
    more <= 0 ? '' : `<p>${String(more)} more on the page.</p>`,
  ].join('');
}
