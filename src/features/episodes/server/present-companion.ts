import { type Appearance } from '../../../domain/appearances/appearance.ts';
import { appearancesFromNotes } from '../../../domain/appearances/appearances-from-notes.ts';
import { gatherCautions } from '../../../domain/cautions/gather-cautions.ts';
import { isCautionTopic } from '../../../domain/cautions/topics.ts';
import { convertPlace } from '../../../domain/notes/convert-place.ts';
import { effectiveEnd, sortNotes } from '../../../domain/notes/note-place.ts';
import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { type Appearance as ByHand, type Note } from '../../notes/note.ts';
import { type ShownResult } from '../../notes/note-result.ts';
import { type Companion, type CompanionNote, type CompanionPart } from '../companion.ts';
import { type Chapter, type Video } from '../episode.ts';

export interface CompanionSources {
  readonly video: Pick<Video, 'seconds' | 'rate'>;
  readonly notes: readonly Note[];
  readonly byHand: readonly ByHand[];
  readonly chapters: readonly Chapter[];
  /** Of the whole build; a part that has been deleted since is shown nowhere. */
  readonly parts: readonly CompanionPart[];
  /** By note, what of a worksheet it carries. */
  readonly results: ReadonlyMap<string, ShownResult>;
}

type Placed = Pick<Companion, 'notes' | 'chapters' | 'appearances' | 'parts' | 'cautions'>;

/**
 * Puts everything that was marked at some rate in its place in the shown video. What begins after the video has
 * ended is left out: it belongs to an edit that viewers do not see.
 */
export function presentCompanion({
  video,
  notes,
  byHand,
  chapters,
  parts,
  results,
}: CompanionSources): Placed {
  const { rate } = video;
  const lengthFrames = video.seconds === null ? null : Math.round((video.seconds * rate.num) / rate.den);
  const isInside = ({ frame }: { readonly frame: number }) => lengthFrames === null || frame < lengthFrames;
  const known = new Set(parts.map(({ id }) => id));
  const placed = sortNotes(
    notes.map((note) => ({
      ...note,
      ...convertPlace(note.position, rate),
      partIds: note.partIds.filter((id) => known.has(id)),
    })),
  ).filter(isInside);
  const appearances = appearancesFromNotes({
    notes: placed,
    byHand: byHand
      .filter(({ partId }) => known.has(partId))
      .map(({ partId, position }) => {
        const { frame, endFrame } = convertPlace(position, rate);
        return { partId, from: frame, to: endFrame ?? effectiveEnd({ frame, endFrame }, placed, rate) };
      })
      .filter(({ from }) => isInside({ frame: from })),
    rate,
    lengthFrames,
  });
  return {
    notes: placed.map((note) => ({
      ...presentNote(note, effectiveEnd(note, placed, rate, lengthFrames), rate),
      result: results.get(note.id) ?? null,
    })),
    chapters: chapters
      .map(({ id, title, position }) => ({ id, title, from: convertPlace(position, rate).frame }))
      .filter(({ from }) => isInside({ frame: from }))
      .map((chapter) => ({ ...chapter, at: secondsOf(chapter.from, rate) }))
      .sort((a, b) => a.from - b.from),
    appearances,
    parts: inOrder(parts, appearances, placed),
    cautions: gatherCautions(placed).map(({ topic, noteId, frame }) => ({
      topic,
      noteId,
      at: secondsOf(frame, rate),
    })),
  };
}

function presentNote(
  note: Note & { readonly frame: number },
  to: number,
  rate: Rate,
): Omit<CompanionNote, 'result'> {
  const { id, kind, text, standing, topic, partIds, frame } = note;
  return {
    id,
    kind,
    text,
    standing,
    topic: isCautionTopic(topic) ? topic : null,
    partIds,
    from: frame,
    to,
    at: secondsOf(frame, rate),
  };
}

/** To the millisecond, rounded up, so that seeking there shows the frame and not the one before it. */
function secondsOf(frame: number, rate: Rate): number {
  return frameToMilliseconds(frame, rate) / 1000;
}

function inOrder(
  parts: readonly CompanionPart[],
  appearances: readonly Appearance[],
  notes: readonly { readonly partIds: readonly string[] }[],
): CompanionPart[] {
  const shown = new Set([
    ...appearances.map(({ partId }) => partId),
    ...notes.flatMap(({ partIds }) => partIds),
  ]);
  const byId = new Map(parts.map((part) => [part.id, part]));
  return [...shown].flatMap((id) => byId.get(id) ?? []);
}
