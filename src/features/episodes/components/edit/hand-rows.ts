import { type HandClip, readClipTime } from '../../../../domain/edit/hand-clip.ts';
import { formatClock } from '../../../../domain/time/format-clock.ts';

/** A clip as it is chosen from. */
export type ListedClip = HandClip & { readonly label: string };

/** A segment as typed. */
export interface HandRow {
  readonly key: number;
  readonly clip: string;
  readonly from: string;
  readonly to: string;
}

/** Rows as the form sends them, and as they stand where no script runs: clip, in, out. */
export function writeRows(rows: readonly HandRow[]): string {
  return rows.map(({ clip, from, to }) => `${clip},${from},${to}`).join('\n');
}

/** Rows out of the form's text. */
export function readRows(text: string, clips: readonly ListedClip[]): HandRow[] {
  return text
    .split('\n')
    .map((line) => line.split(',').map((cell) => cell.trim()))
    .filter(([clip]) => clip !== undefined && clip !== '' && clip !== 'clip')
    .map(([clip = '', from = '', to = ''], key) => ({
      key,
      clip: clips.find(({ id, name }) => id === clip || name === clip)?.id ?? clip,
      from,
      to,
    }));
}

/** How long all rows are that can be read, as a clock; with how many cannot yet. */
export function sayTotal(rows: readonly HandRow[], clips: readonly ListedClip[]): string {
  let seconds = 0;
  let open = 0;
  for (const { clip: id, from, to } of rows) {
    const clip = clips.find((one) => one.id === id);
    const start = clip && readClipTime(from, clip);
    const end = clip && readClipTime(to, clip);
    if (clip && start?.ok && end?.ok && end.value > start.value)
      seconds += ((end.value - start.value) * clip.rate.den) / clip.rate.num;
    else open += 1;
  }
  return open === 0 ? formatClock(seconds) : `${formatClock(seconds)}, ${String(open)} without a length yet`;
}

/** The rows with one moved by a place. */
export function moveRow(rows: readonly HandRow[], index: number, by: -1 | 1): HandRow[] {
  const [one, other] = [rows[index], rows[index + by]];
  if (one === undefined || other === undefined) return [...rows];
  return rows.map((row, at) => (at === index ? other : at === index + by ? one : row));
}
