import { and, eq, isNull } from 'drizzle-orm';
import { type episodes } from '../../../db/schema/episodes.ts';
import { files } from '../../../db/schema/files.ts';
import { parts } from '../../../db/schema/parts.ts';
import { type PublishCheck } from '../../../domain/episode-checks/publish-check.ts';
import { publishChecks } from '../../../domain/episode-checks/publish-checks.ts';
import { type PublishFacts } from '../../../domain/episode-checks/publish-facts.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { sayLengthsApart } from '../../../domain/edit/compare-lengths.ts';
import { convertPlace } from '../../../domain/notes/convert-place.ts';
import { type Position } from '../../../domain/positions.ts';
import { frameToMilliseconds } from '../../../domain/time/frames.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { type Build } from '../../builds/build.ts';
import { findDraftView } from '../../notes/server/episode-view.ts';
import { loadNotes, ofEpisode } from '../../notes/server/load-notes.ts';
import { type Video } from '../episode.ts';
import { loadChapters } from './load-chapters.ts';
import { findDraftEdit } from '../../notes/server/load-edits.ts';
import { findDraftCaptions, findDraftVideo } from './load-episode.ts';

const MILLISECONDS = { num: 1000, den: 1 };

/** The checks before publishing, computed from what the draft holds now. */
export async function loadPublishChecks(
  { db }: WorkshopContext,
  build: Build,
  episode: typeof episodes.$inferSelect,
): Promise<PublishCheck[]> {
  const video = await findDraftVideo(db, episode.id);
  const captions = await findDraftCaptions(db, episode.id);
  const edit = await findDraftEdit(db, episode.id);
  const rate = video?.rate ?? MILLISECONDS;
  const place = (position: Position) => convertPlace(position, rate);
  const view = await findDraftView(db, episode.id);
  const notes = await loadNotes(db, view, ofEpisode(view));
  const chapters = await loadChapters(db, view);
  const partsOfBuild = await db
    .select({ id: parts.id, number: parts.number, name: parts.name, inPlans: parts.inPlans })
    .from(parts)
    .where(and(eq(parts.buildId, build.id), isNull(parts.deletedAt)));
  return publishChecks({
    title: episode.title,
    video: video && { state: await stateOf(db, video), lengthFrames: lengthOf(video) },
    rate,
    edit: edit && { lengthsApart: video === null ? null : lengthsApart(edit.edit, video) },
    chapters: chapters.map(({ title, position }) => ({
      start: frameToMilliseconds(position.frame, position.rate),
      title,
    })),
    captionCount: captions?.cueCount ?? null,
    notes: notes.map((note) => ({
      ...place(note.position),
      id: note.id,
      text: note.text,
      audience: note.audience,
      proposed: note.proposed,
      topic: note.topic,
      partIds: note.partIds,
      waitsFor: note.audience === 'person' && note.answer === null ? (note.asked?.name ?? '') : null,
    })),
    parts: partsOfBuild,
    revision: null,
  });
}

function lengthsApart(edit: Edit, { seconds, rate, fileId }: Video): string | null {
  return seconds === null ? null : sayLengthsApart(edit, { seconds, rate, typed: fileId === null });
}

function lengthOf({ seconds, rate }: Video): number | null {
  return seconds === null ? null : Math.round((seconds * rate.num) / rate.den);
}

async function stateOf(
  db: WorkshopContext['db'],
  { fileId }: Video,
): Promise<NonNullable<PublishFacts['video']>['state']> {
  if (fileId === null) return 'ready';
  const [file] = await db.select({ state: files.state }).from(files).where(eq(files.id, fileId));
  if (file?.state === 'ready') return 'ready';
  return file?.state === 'failed' ? 'failed' : 'waiting';
}
