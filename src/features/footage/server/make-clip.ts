import { and, eq, isNull } from 'drizzle-orm';
import { text as readText } from 'node:stream/consumers';
import { z } from 'zod';
import { type Database } from '../../../db/client.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { cameras, clips } from '../../../db/schema/footage.ts';
import { readFilmed } from '../../../domain/footage/clip-list-row.ts';
import { type NamedClip } from '../../../domain/footage/named-clip.ts';
import { AS_FILMED } from '../../../domain/footage/pace.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { parseTimecode } from '../../../domain/time/timecode.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { type Services } from '../../../server/services.ts';
import { keyOf } from '../../../server/storage/storage.ts';
import { type Probe } from '../../files/probe.ts';
import { findCamera } from './find-camera.ts';
import { identityOf, keepClips } from './keep-clips.ts';

type FileRow = typeof files.$inferSelect;

/** Makes the clip of a film or sound that was sent as footage; one that was named before takes the file. */
export const makeClip: JobHandler = async (services, { fileId = '' }) => {
  const frameTimes = await readKeptFrameTimes(services, fileId);
  await services.db.transaction(async (transaction) => {
    const [file] = await transaction
      .select()
      .from(files)
      .where(and(eq(files.id, fileId), eq(files.state, 'ready'), isNull(files.deletedAt)));
    if (file?.purpose !== 'footage' || (file.kind !== 'video' && file.kind !== 'sound')) return;
    const { rateNum, rateDen, workshopId, buildId, addedBy } = file;
    if (rateNum === null || rateDen === null) return;
    const [made] = await transaction.select({ id: clips.id }).from(clips).where(eq(clips.fileId, file.id));
    if (made) return;
    const said = clipOf(file, { num: rateNum, den: rateDen });
    const { filmedWith } = (file.probe ?? {}) as Probe;
    const filmedBy = filmedWith === undefined ? null : await findCamera(transaction, workshopId, filmedWith);
    const named = await findNamed(transaction, buildId, said);
    const clip = { ...said, camera: named === null ? (filmedBy?.name ?? null) : named.camera };
    const of = { workshopId, buildId, addedBy, now: new Date() };
    const { ids } = await keepClips(transaction, of, [{ line: 1, clip, frameTimes, fileId: file.id }]);
    if (clip.camera === null && filmedBy !== null)
      await transaction
        .update(clips)
        .set({ cameraId: filmedBy.id })
        .where(eq(clips.id, ids[0] ?? ''));
    await services.jobs.enqueue(transaction, 'footage-changed', { build: buildId });
  });
};

/** What the file says of its clip. */
function clipOf({ name, durationFrames, probe }: FileRow, rate: Rate): NamedClip {
  const { camera, timecode } = (probe ?? {}) as Probe;
  const label = timecode === undefined ? null : parseTimecode(timecode, rate);
  return {
    name,
    camera: null,
    frames: durationFrames === 0 ? null : durationFrames,
    rate,
    startLabel: label?.ok === true ? label.value.frame : null,
    drop: label?.ok === true && label.value.drop,
    ...filmedAt(camera),
    pace: AS_FILMED,
    stage: null,
    parts: [],
  };
}

/** What the camera wrote: with the zone that it gave, in UTC where the field is for UTC, or without any. */
function filmedAt(camera: Probe['camera']) {
  const unknown = { createdWall: null, createdOffset: null };
  if (camera === undefined) return unknown;
  const zone = camera.offset ?? (camera.assumedZone === 'UTC' ? 'Z' : '');
  const read = readFilmed(`${camera.wallTime}${zone}`);
  return read.ok ? read.value : unknown;
}

/** The one clip that stays at home and is this one but for its camera, which a file does not know; null for none. */
async function findNamed(
  db: Database,
  buildId: string,
  { name, rate, ...clip }: NamedClip,
): Promise<{ readonly camera: string | null } | null> {
  const rows = await db
    .select({ clip: clips, camera: cameras.name })
    .from(clips)
    .leftJoin(cameras, eq(cameras.id, clips.cameraId))
    .where(
      and(eq(clips.buildId, buildId), eq(clips.name, name), isNull(clips.fileId), isNull(clips.deletedAt)),
    );
  const wanted = identityOf({ ...clip, name, rateNum: rate.num, rateDen: rate.den });
  const same = rows.filter((row) => identityOf({ ...row.clip, cameraId: null }) === wanted);
  return same.length === 1 && same[0] !== undefined ? same[0] : null;
}

const FrameTimes = z.array(z.number());

/** When the frames of a film come, where they come unevenly; they are kept beside it, for there may be a million. */
async function readKeptFrameTimes({ db, storage }: Services, fileId: string): Promise<number[] | null> {
  const [kept] = await db
    .select({ workshopId: fileVariants.workshopId })
    .from(fileVariants)
    .where(and(eq(fileVariants.fileId, fileId), eq(fileVariants.variant, 'frame-times')));
  if (kept === undefined) return null;
  const stored = await storage.read(keyOf(kept.workshopId, fileId, 'frame-times'));
  return FrameTimes.parse(JSON.parse(await readText(stored)));
}
