import { and, eq, isNull } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { clips } from '../../../db/schema/footage.ts';
import { readFilmed } from '../../../domain/footage/clip-list-row.ts';
import { AS_FILMED } from '../../../domain/footage/pace.ts';
import { parseTimecode } from '../../../domain/time/timecode.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { type Probe } from '../../files/probe.ts';
import { keepClips } from './keep-clips.ts';

/** Makes the clip of a film or sound that was sent as footage; one that was named before takes the file. */
export const makeClip: JobHandler = async ({ db, jobs }, { fileId = '' }) => {
  await db.transaction(async (transaction) => {
    const [file] = await transaction
      .select()
      .from(files)
      .where(and(eq(files.id, fileId), eq(files.state, 'ready'), isNull(files.deletedAt)));
    if (file?.purpose !== 'footage' || (file.kind !== 'video' && file.kind !== 'sound')) return;
    const { durationFrames, rateNum, rateDen, workshopId, buildId, addedBy } = file;
    if (rateNum === null || rateDen === null) return;
    const [made] = await transaction.select({ id: clips.id }).from(clips).where(eq(clips.fileId, file.id));
    if (made) return;
    const { camera, timecode } = (file.probe ?? {}) as Probe;
    const rate = { num: rateNum, den: rateDen };
    const label = timecode === undefined ? null : parseTimecode(timecode, rate);
    const clip = {
      name: file.name,
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
    const of = { workshopId, buildId, addedBy, now: new Date() };
    await keepClips(transaction, of, [{ line: 1, clip, fileId: file.id }]);
    await jobs.enqueue(transaction, 'footage-changed', { build: buildId });
  });
};

/** What the camera wrote: with the zone that it gave, in UTC where the field is for UTC, or without any. */
function filmedAt(camera: Probe['camera']) {
  const unknown = { createdWall: null, createdOffset: null };
  if (camera === undefined) return unknown;
  const zone = camera.offset ?? (camera.assumedZone === 'UTC' ? 'Z' : '');
  const read = readFilmed(`${camera.wallTime}${zone}`);
  return read.ok ? read.value : unknown;
}
