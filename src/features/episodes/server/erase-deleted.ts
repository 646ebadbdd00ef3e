import { and, eq, inArray, lt, notExists, type SQL } from 'drizzle-orm';
import { type PgTable } from 'drizzle-orm/pg-core';
import { type Database } from '../../../db/client.ts';
import { builds, stages } from '../../../db/schema/builds.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { editions, episodes } from '../../../db/schema/episodes.ts';
import { files } from '../../../db/schema/files.ts';
import { clipParts, clips, workStretches } from '../../../db/schema/footage.ts';
import { anchors, appearances, chapters, noteParts, notes } from '../../../db/schema/notes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { questionParts, questions } from '../../../db/schema/questions.ts';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { type Services } from '../../../server/services.ts';
import { KEPT_DAYS } from '../../builds/build.ts';
import { eraseFootage } from '../../footage/server/erase-footage.ts';
import { eraseDeletedFiles } from '../../files/server/erase-deleted-files.ts';

const DAY_MS = 24 * 3_600_000;

/**
 * Erases what was deleted thirty days ago and can no longer be brought back: what refers to something goes before
 * it, and what is still referred to stays for another night. Run twice it does no harm.
 * @param now the instant from which the days are counted back
 */
export async function eraseDeleted(services: Services, now: Date): Promise<void> {
  const { db } = services;
  const before = new Date(now.getTime() - KEPT_DAYS * DAY_MS);
  await eraseMarked(db, before);
  await eraseFootage(db, before);
  await eraseWorksheets(db, before);
  await db.delete(diaryEntries).where(lt(diaryEntries.deletedAt, before));
  await eraseStages(db, before);
  await eraseParts(db, before);
  const old = await db.select({ id: episodes.id }).from(episodes).where(lt(episodes.deletedAt, before));
  for (const { id } of old)
    await unlessInUse(services, 'episode', id, (within) => eraseEpisodes(within, eq(episodes.id, id)));
  const oldBuilds = await db.select({ id: builds.id }).from(builds).where(lt(builds.deletedAt, before));
  for (const { id } of oldBuilds)
    await unlessInUse(services, 'build', id, (within) => emptyBuild(within, id, before));
  await eraseDeletedFiles(services, before);
  for (const { id } of oldBuilds)
    await unlessInUse(services, 'build', id, (within) => eraseEmptyBuild(within, id));
}

/** Notes, chapters and parts in view, each with the anchor that was made for it. */
async function eraseMarked(db: Database, before: Date): Promise<void> {
  // What was asked about a note stays, at its moment.
  const old = db.select({ id: notes.id }).from(notes).where(lt(notes.deletedAt, before));
  await db.update(questions).set({ noteId: null }).where(inArray(questions.noteId, old));
  for (const table of [notes, chapters, appearances]) {
    const gone = await db
      .delete(table)
      .where(lt(table.deletedAt, before))
      .returning({ anchorId: table.anchorId });
    const ids = gone.map(({ anchorId }) => anchorId);
    if (ids.length > 0) await db.delete(anchors).where(inArray(anchors.id, ids));
  }
}

/** A worksheet outlives what it belongs to, and then is the build's. */
async function eraseWorksheets(db: Database, before: Date): Promise<void> {
  await db.delete(worksheets).where(lt(worksheets.deletedAt, before));
  const owners = [
    { table: stages, column: worksheets.stageId, none: { stageId: null } },
    { table: parts, column: worksheets.partId, none: { partId: null } },
    { table: diaryEntries, column: worksheets.entryId, none: { entryId: null } },
    { table: episodes, column: worksheets.episodeId, none: { episodeId: null } },
  ] as const;
  for (const { table, column, none } of owners) {
    const old = db.select({ id: table.id }).from(table).where(lt(table.deletedAt, before));
    await db.update(worksheets).set(none).where(inArray(column, old));
  }
}

/** Diary entries, clips and hours that stayed when their stage was deleted stay now too, and point at it no more. */
async function eraseStages(db: Database, before: Date): Promise<void> {
  const old = db.select({ id: stages.id }).from(stages).where(lt(stages.deletedAt, before));
  for (const table of [diaryEntries, clips, workStretches])
    await db.update(table).set({ stageId: null }).where(inArray(table.stageId, old));
  await db.delete(stages).where(lt(stages.deletedAt, before));
}

async function eraseParts(db: Database, before: Date): Promise<void> {
  const uses = [noteParts, appearances, questionParts, clipParts].map((table) =>
    notExists(db.select({ partId: table.partId }).from(table).where(eq(table.partId, parts.id))),
  );
  await db.delete(parts).where(and(lt(parts.deletedAt, before), ...uses));
}

/** Episodes with all that is theirs; editions first, because they keep their video and captions. */
async function eraseEpisodes(db: Database, which: SQL): Promise<void> {
  const ids = db.select({ id: episodes.id }).from(episodes).where(which);
  await db.delete(editions).where(inArray(editions.episodeId, ids));
  await db.delete(episodes).where(which);
}

/** Leaves nothing of a build but its files, which are marked to be erased with their objects. */
async function emptyBuild(db: Database, id: string, before: Date): Promise<void> {
  await db.delete(worksheets).where(eq(worksheets.buildId, id));
  await eraseEpisodes(db, eq(episodes.buildId, id));
  for (const table of [questions, anchors, clips, workStretches, diaryEntries, stages, parts] as const)
    await db.delete(table as PgTable).where(eq(table.buildId, id));
  await db
    .update(files)
    .set({ deletedAt: new Date(before.getTime() - 1) })
    .where(eq(files.buildId, id));
}

async function eraseEmptyBuild(db: Database, id: string): Promise<void> {
  const left = db.select({ id: files.id }).from(files).where(eq(files.buildId, id));
  await db.delete(builds).where(and(eq(builds.id, id), notExists(left)));
}

/** In one transaction, or not at all: what a feature further on still keeps is left for the next night. */
async function unlessInUse(
  { db, log }: Services,
  what: string,
  id: string,
  erase: (db: Database) => Promise<void>,
): Promise<void> {
  try {
    await db.transaction(erase);
  } catch (error) {
    log.warn({ err: error, id }, `A deleted ${what} is still referred to and stays.`);
  }
}
