import { eq } from 'drizzle-orm';
import { statfs } from 'node:fs/promises';
import { join } from 'node:path';
import { files } from '../../../db/schema/files.ts';
import { cameraOfTags } from '../../../domain/footage/camera-of-tags.ts';
import { averageOf } from '../../../domain/footage/frame-times.ts';
import { framesIn } from '../../../domain/media-rates.ts';
import { isRate, MILLISECOND_RATE, snapRate } from '../../../domain/time/rate.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { findCutOff } from '../../../server/media/box-lengths.ts';
import { drawWaveform } from '../../../server/media/draw-waveform.ts';
import { takeFrames, takeStill } from '../../../server/media/film-frames.ts';
import { type MediaFormat } from '../../../server/media/media-input.ts';
import { makeFilmstrip, makeStills } from '../../../server/media/picture-copies.ts';
import { canCopyStreams, renditionArgs, soundArgs } from '../../../server/media/plan-rendition.ts';
import { type MediaFacts, probeMedia } from '../../../server/media/probe-media.ts';
import { type FrameTimes, readFrameTimes } from '../../../server/media/read-frame-times.ts';
import { RefusedFile } from '../../../server/media/refused-file.ts';
import { runFfmpeg } from '../../../server/media/run-ffmpeg.ts';
import { oneAtATime } from '../../../server/run-program.ts';
import { SNIFF_BYTES, sniffFile } from '../../../server/media/sniff-file.ts';
import { type Services } from '../../../server/services.ts';
import { fetchToFile } from '../../../server/storage/local-copy.ts';
import { incomingKey } from '../../../server/storage/storage.ts';
import { open } from 'node:fs/promises';
import { filmTime } from './camera-time.ts';
import { type CheckedFile, checkFile } from './check-file.ts';
import { type AcceptedAs, acceptAs, keepVariants } from './keep-variants.ts';

const SPARE_BYTES = 512 * 2 ** 20;
const PROGRESS_MS = 2_000;
const CONTENT_TYPES: Readonly<Record<MediaFormat, { readonly video: string; readonly sound: string }>> = {
  mov: { video: 'video/mp4', sound: 'audio/mp4' },
  matroska: { video: 'video/x-matroska', sound: 'audio/x-matroska' },
  wav: { video: 'audio/wav', sound: 'audio/wav' },
  mp3: { video: 'audio/mpeg', sound: 'audio/mpeg' },
};

/** Takes in a film or a sound: still, filmstrip, and the copy that is played. */
export const acceptMedia: JobHandler = (services, ids) =>
  oneAtATime(() =>
    checkFile(services, ids['fileId'] ?? '', async (file, folder) => {
      await requireRoom(folder, file.bytes);
      const path = join(folder, 'original');
      await fetchToFile(services.storage, incomingKey(file.workshopId, file.id), file.bytes, path);
      const format = await formatOf(path, file.name);
      const cutOff = await findCutOff(path, format);
      if (cutOff !== null) throw new RefusedFile(cutOff);
      const facts = await probeMedia(path, format);
      const film = { path, format, length: facts.seconds.num / facts.seconds.den };
      if (facts.video === null) await acceptSound(services, file, facts, film, folder);
      else await acceptFilm(services, file, facts, film, folder);
    }),
  );

type Film = { readonly path: string; readonly format: MediaFormat; readonly length: number };

async function requireRoom(folder: string, bytes: number): Promise<void> {
  const { bavail, bsize } = await statfs(folder);
  if (bavail * bsize < bytes * 2 + SPARE_BYTES)
    throw new Error('There is not enough room on the disk to look at this file.');
}

async function formatOf(path: string, name: string): Promise<MediaFormat> {
  const file = await open(path, 'r');
  try {
    const { buffer, bytesRead } = await file.read(Buffer.alloc(SNIFF_BYTES), 0, SNIFF_BYTES, 0);
    const sniffed = sniffFile(buffer.subarray(0, bytesRead), name);
    if (sniffed.kind !== 'media') throw new Error('A file has changed its kind between two looks.');
    return sniffed.format;
  } finally {
    await file.close();
  }
}

async function acceptFilm(
  services: Services,
  file: CheckedFile,
  facts: MediaFacts,
  film: Film,
  folder: string,
): Promise<void> {
  const still = await takeStill(film, Math.min(film.length / 10, 10), folder);
  // Seen in the list while the rest is made.
  await keepVariants(services, file, await makeStills(still));
  await keepVariants(services, file, [await makeFilmstrip(await takeFrames(film, folder))]);
  const path = join(folder, 'video.mp4');
  await render(services, file, film, renditionArgs(facts, path));
  // What is kept is looked at once more: this also finds a film whose end could not be read.
  const made = await probeMedia(path, 'mov');
  if (made.seconds.num / made.seconds.den < film.length - 1 - film.length * 0.02) {
    throw new RefusedFile(
      'The film breaks off before its end: it is damaged. Copy it from the card again and send that.',
    );
  }
  await keepVariants(services, file, [
    {
      variant: 'video',
      contentType: 'video/mp4',
      path,
      ...(made.video && { width: made.video.width, height: made.video.height }),
    },
  ]);
  if (made.audio !== null) await keepWaveform(services, file, { ...film, path, format: 'mov' }, folder);
  const frames = await keepFrameTimes(services, file, facts, film);
  await acceptAs(services, file, filmFacts(file, facts, film.format, frames));
}

/** Draws the sound of footage by the copy that is played, which is smaller than what was sent. */
async function keepWaveform(
  services: Services,
  file: CheckedFile,
  film: Film,
  folder: string,
): Promise<void> {
  if (file.purpose !== 'footage') return;
  const drawn = await drawWaveform(film, folder);
  if (drawn !== null) await keepVariants(services, file, [drawn]);
}

/** Keeps when each frame is shown, where they come unevenly, for the clip that is made of footage; null where none is. */
async function keepFrameTimes(
  services: Services,
  file: CheckedFile,
  facts: MediaFacts,
  film: Film,
): Promise<FrameTimes | null> {
  // A Matroska file gives no rate of its own: ffprobe's is a guess by the beginning.
  const mayBeUneven = facts.video?.variableRate === true || film.format === 'matroska';
  if (file.purpose !== 'footage' || facts.video === null || !mayBeUneven) return null;
  const frames = await readFrameTimes(film.path, film.format);
  if (frames.times !== null) {
    const bytes = Buffer.from(JSON.stringify(frames.times));
    await keepVariants(services, file, [{ variant: 'frame-times', contentType: 'application/json', bytes }]);
  }
  return frames;
}

async function acceptSound(
  services: Services,
  file: CheckedFile,
  facts: MediaFacts,
  film: Film,
  folder: string,
): Promise<void> {
  const path = join(folder, 'sound.m4a');
  await render(services, file, film, soundArgs(facts, path));
  await keepVariants(services, file, [{ variant: 'sound', contentType: 'audio/mp4', path }]);
  await keepWaveform(services, file, { ...film, path, format: 'mov' }, folder);
  await acceptAs(services, file, filmFacts(file, facts, film.format, null));
}

/** Makes the playable copy and says in the file's row how far it is. */
async function render(
  { db }: Services,
  file: CheckedFile,
  film: Film,
  output: readonly string[],
): Promise<void> {
  let toldAt = 0;
  await runFfmpeg({
    ...film,
    output,
    // Twenty times its own length on a slow machine, and never more than half a day.
    seconds: Math.min(11 * 3600, 600 + film.length * 20),
    fileBytes: Math.max(file.bytes * 2, 2 ** 30) + film.length * 2 * 2 ** 20,
    onProgress: (seconds) => {
      if (Date.now() - toldAt < PROGRESS_MS) return;
      toldAt = Date.now();
      const progress = Math.min(99, Math.floor((100 * seconds) / film.length));
      // The next report makes up for one that is lost.
      void db
        .update(files)
        .set({ progress, updatedAt: new Date() })
        .where(eq(files.id, file.id))
        .then(undefined, () => undefined);
    },
  });
}

function filmFacts(
  file: CheckedFile,
  facts: MediaFacts,
  format: MediaFormat,
  frames: FrameTimes | null,
): AcceptedAs {
  const { video, audio, seconds, tags } = facts;
  const times = format === 'matroska' ? (frames?.times ?? null) : null;
  const average = times === null ? (video?.averageRate ?? null) : averageOf(times);
  const rate = average === null || !isRate(average) ? MILLISECOND_RATE : snapRate(average);
  return {
    kind: video === null ? 'sound' : 'video',
    contentType: CONTENT_TYPES[format][video === null ? 'sound' : 'video'],
    ...(video && { width: video.width, height: video.height }),
    durationFrames: framesIn(seconds, rate),
    rateNum: rate.num,
    rateDen: rate.den,
    probe: {
      camera: filmTime(tags, file.timeZone) ?? undefined,
      videoCodec: video?.codec,
      audioCodec: audio?.codec,
      timecode: tags['timecode'],
      variableRate: frames === null ? video?.variableRate : frames.times !== null || frames.unread,
      frameTimesUnread: frames?.unread === true ? true : undefined,
      filmedWith: cameraOfTags(tags) ?? undefined,
      copied: canCopyStreams(facts),
    },
  };
}
