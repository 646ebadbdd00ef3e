import { type ComparedSegment, type SegmentChange } from '../../../../domain/edit/compare-edits.ts';
import { type Edit, type Segment } from '../../../../domain/edit/edit.ts';
import { sayFrames } from '../../../../domain/edit/say-frames.ts';
import { type Rate } from '../../../../domain/time/rate.ts';

export const CHANGES = {
  same: 'as before',
  moved: 'moved',
  trimmed: 'trimmed',
  new: 'new',
  dropped: 'not in this edit',
} as const satisfies Record<SegmentChange, string>;

/** A segment as a row of a table: every time as a label. */
export interface SegmentRow {
  readonly clip: string;
  readonly source: string;
  readonly record: string;
  readonly speed: string;
  readonly track: string;
  readonly change: SegmentChange | null;
  /** Of one that moved or was trimmed: where it was. */
  readonly was: string | null;
}

/** A speed as editors say it: 50 %, held, backwards. */
export function saySpeed({ speed }: Pick<Segment, 'speed'>): string {
  if (speed.equals(0)) return 'held';
  const percent = String(Number(speed.abs().mul(100).valueOf().toFixed(2)));
  if (speed.compare(0) < 0) return speed.equals(-1) ? 'backwards' : `backwards, ${percent} %`;
  return speed.equals(1) ? '' : `${percent} %`;
}

function toRow(segment: Segment, rate: Rate, change: SegmentChange | null, was: Segment | null): SegmentRow {
  const { clip, clipRate, source, record, track } = segment;
  const span = (stretch: typeof record, at: Rate) =>
    `${sayFrames(stretch.in, at)} – ${sayFrames(stretch.out, at)}`;
  const before =
    was === null
      ? null
      : change === 'moved'
        ? sayFrames(was.record.in, rate)
        : span(was.source, was.clipRate);
  return {
    clip,
    source: span(source, clipRate),
    record: span(record, rate),
    speed: saySpeed(segment),
    track,
    change,
    was: change === 'moved' || change === 'trimmed' ? before : null,
  };
}

/** The rows of an edit: its pictures with what became of them, then its sound. */
export function segmentRows(edit: Edit, compared: readonly ComparedSegment[] | null): SegmentRow[] {
  const pictures =
    compared === null
      ? edit.picture.map((segment) => toRow(segment, edit.rate, null, null))
      : compared.flatMap(({ change, before, after }) => {
          const segment = after ?? before;
          return segment === null ? [] : [toRow(segment, edit.rate, change, before)];
        });
  return [...pictures, ...edit.sound.map((segment) => toRow(segment, edit.rate, null, null))];
}

/** “3 moved, 1 trimmed, 2 new, 1 not in this edit, 40 as before”. */
export function sayChanges(compared: readonly ComparedSegment[]): string {
  const counted = (['moved', 'trimmed', 'new', 'dropped', 'same'] as const).map(
    (kind) => [kind, compared.filter(({ change }) => change === kind).length] as const,
  );
  return counted
    .filter(([, count]) => count > 0)
    .map(([kind, count]) => `${count.toLocaleString('en-GB')} ${CHANGES[kind]}`)
    .join(', ');
}
