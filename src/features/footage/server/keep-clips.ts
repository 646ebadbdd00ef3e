import { and, eq, isNull, sql } from 'drizzle-orm';
import Fraction from 'fraction.js';
import { newId } from '../../../db/columns.ts';
import { type Database } from '../../../db/client.ts';
import { builds } from '../../../db/schema/builds.ts';
import { clipParts, clips } from '../../../db/schema/footage.ts';
import { clipStart } from '../../../domain/footage/creation-time.ts';
import { type NamedClip } from '../../../domain/footage/named-clip.ts';
import { wallAsUtc } from '../../../domain/time/wall-time.ts';
import { type KeptClips } from '../footage.ts';
import { type FootageOf, type KnownNames, resolveNames } from './resolve-names.ts';

/** A clip on its way in. */
export interface ClipToKeep {
  /** Of the list it came in, counted from 1. */
  readonly line: number;
  readonly clip: NamedClip;
  readonly frameTimes?: readonly number[] | null;
  /** Of a clip that is kept here. */
  readonly fileId?: string;
}

const CHUNK = 500;
type NewClip = typeof clips.$inferInsert & { readonly id: string };

/**
 * Keeps clips of a build. A clip is known by its camera, name, length and start: sent again it is kept once, and takes
 * what is new of it. What is odd about one is told by its line; it is kept all the same.
 */
export async function keepClips(
  db: Database,
  of: FootageOf & { readonly addedBy: string | null; readonly now: Date },
  list: readonly ClipToKeep[],
): Promise<KeptClips> {
  // One list of a build at a time, so that no clip of two is kept twice.
  await db.select({ id: builds.id }).from(builds).where(eq(builds.id, of.buildId)).for('no key update');
  const clipsOf = list.map(({ clip }) => clip);
  const known = await resolveNames(db, of, clipsOf);
  const stored = await db
    .select()
    .from(clips)
    .where(and(eq(clips.buildId, of.buildId), isNull(clips.deletedAt)));
  const idOf = new Map(stored.map((row) => [identityOf(row), row.id]));
  const there = new Set(idOf.values());
  const fresh: NewClip[] = [];
  const again: NewClip[] = [];
  const problems: { line: number; text: string }[] = [];
  const ids = list.map((one) => {
    problems.push(...findProblems(one, known, of.now));
    const row = rowOf(one, known, of);
    const before = idOf.get(identityOf(row));
    if (before === undefined) {
      idOf.set(identityOf(row), row.id);
      fresh.push(row);
      return row.id;
    }
    if (there.has(before)) again.push({ ...row, id: before });
    return before;
  });
  for (let from = 0; from < fresh.length; from += CHUNK)
    await db.insert(clips).values(fresh.slice(from, from + CHUNK));
  for (const row of again) await updateClip(db, row, of.now);
  await addParts(db, of.workshopId, list, ids, known);
  return { added: fresh.length, updated: new Set(again.map(({ id }) => id)).size, ids, problems };
}

/**
 * By what a clip is known: never by its name alone, for cards start again at the same numbers. One moment written in two
 * zones is the same.
 */
export function identityOf(row: {
  readonly cameraId?: string | null | undefined;
  readonly name: string;
  readonly frames?: number | null | undefined;
  readonly rateNum: number;
  readonly rateDen: number;
  readonly createdWall?: string | null | undefined;
  readonly createdOffset?: number | null | undefined;
}): string {
  const wall = row.createdWall == null ? null : wallAsUtc(row.createdWall);
  const length = row.frames == null ? null : [row.frames, row.rateNum / row.rateDen];
  const created = wall === null ? null : wall - (row.createdOffset ?? 0) * 60_000;
  return JSON.stringify([row.cameraId ?? null, row.name, length, created, row.createdOffset == null]);
}

function rowOf(
  { clip, frameTimes, fileId }: ClipToKeep,
  known: KnownNames,
  { workshopId, buildId, addedBy }: FootageOf & { readonly addedBy: string | null },
): NewClip {
  return {
    id: newId(),
    workshopId,
    buildId,
    cameraId: known.camera(clip.camera),
    fileId: fileId ?? null,
    name: clip.name,
    frames: clip.frames,
    rateNum: clip.rate.num,
    rateDen: clip.rate.den,
    startLabel: clip.startLabel,
    drop: clip.drop,
    createdWall: clip.createdWall,
    createdOffset: clip.createdOffset,
    paceNum: clip.pace.num,
    paceDen: clip.pace.den,
    frameTimes: frameTimes ?? null,
    stageId: known.stage(clip.stage),
    addedBy,
  };
}

/** What came empty this time leaves what is stored as it is. */
async function updateClip(db: Database, row: NewClip, now: Date): Promise<void> {
  await db
    .update(clips)
    .set({
      ...(row.startLabel != null && { startLabel: row.startLabel, drop: row.drop }),
      ...(row.paceNum !== row.paceDen && { paceNum: row.paceNum, paceDen: row.paceDen }),
      ...(row.frameTimes != null && { frameTimes: row.frameTimes }),
      ...(row.stageId != null && { stageId: row.stageId }),
      ...(row.fileId != null && { fileId: row.fileId }),
      version: sql`${clips.version} + 1`,
      updatedAt: now,
    })
    .where(eq(clips.id, row.id));
}

async function addParts(
  db: Database,
  workshopId: string,
  list: readonly ClipToKeep[],
  ids: readonly string[],
  known: KnownNames,
): Promise<void> {
  const rows = list.flatMap(({ clip }, index) =>
    clip.parts.flatMap((number) => {
      const [clipId, partId] = [ids[index], known.part(number)];
      return clipId === undefined || partId === null ? [] : [{ workshopId, clipId, partId }];
    }),
  );
  for (let from = 0; from < rows.length; from += CHUNK)
    await db
      .insert(clipParts)
      .values(rows.slice(from, from + CHUNK))
      .onConflictDoNothing();
}

function findProblems(
  { line, clip }: ClipToKeep,
  known: KnownNames,
  now: Date,
): { line: number; text: string }[] {
  const tell = (text: string) => ({ line, text: `${clip.name}: ${text}` });
  const created = clip.createdWall === null ? null : wallAsUtc(clip.createdWall);
  const start = clipStart(created, 'start', new Fraction(0), now.getTime());
  return [
    ...(start.ok
      ? []
      : [tell(`${start.error} It was taken; set its start on its page, or film a clock slate.`)]),
    ...(clip.stage !== null && known.stage(clip.stage) === null
      ? [tell(`There is no stage “${clip.stage}” in this build; it was left without one.`)]
      : []),
    ...clip.parts
      .filter((number) => known.part(number) === null)
      .map((number) => tell(`There is no part ${number} in the parts list; it was left out.`)),
  ];
}
