import { and, eq, isNull } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { videos } from '../../../db/schema/episodes.ts';
import { files } from '../../../db/schema/files.ts';
import { parseClock } from '../../../domain/time/parse-clock.ts';
import { readVideoAddress } from '../../../domain/video-addresses/read-video-address.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type SetVideo } from '../episode.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';

/** A video elsewhere reports seconds; its moments are counted in thousandths. */
const MILLISECONDS = { rateNum: 1000, rateDen: 1 };

/**
 * Gives the draft its video: a file of the build, or an address elsewhere. Viewers see it with the next edition.
 * @throws Invalid at `fileId`, `address` or `length`
 */
export const setVideo = verb({ may: 'edit.change' }, async (context, input: EpisodeRef & SetVideo) => {
  const { db, workshop, actor } = context;
  const { episode } = await loadEpisode(context, input);
  const source = await readSource(context, episode.buildId, input);
  const id = newId();
  await db.insert(videos).values({
    id,
    workshopId: workshop.id,
    episodeId: episode.id,
    addedBy: actor.kind === 'account' ? actor.id : null,
    ...source,
  });
  return { id };
});

function readSource(context: WorkshopContext, buildId: string, { fileId, address, length }: SetVideo) {
  if (fileId !== null) return readFile(context, buildId, fileId);
  if (address !== null) return readAddress(address, length);
  throw new Invalid({ '': 'Choose a video file, or give the address of the video.' });
}

async function readFile({ db }: WorkshopContext, buildId: string, fileId: string) {
  const [file] = await db
    .select()
    .from(files)
    .where(and(eq(files.id, fileId), eq(files.buildId, buildId), isNull(files.deletedAt)));
  if (file?.kind !== 'video') throw new Invalid({ fileId: 'Choose a video of this build.' });
  if (file.state !== 'ready')
    throw new Invalid({ fileId: 'This video is not ready yet. Wait for its check.' });
  return {
    fileId,
    durationFrames: file.durationFrames,
    rateNum: file.rateNum ?? MILLISECONDS.rateNum,
    rateDen: file.rateDen ?? MILLISECONDS.rateDen,
  };
}

function readAddress(address: string, length: string | undefined) {
  const read = readVideoAddress(address);
  if (!read.ok) throw new Invalid({ address: read.error });
  const seconds = length === undefined || length === '' ? null : parseClock(length);
  if (seconds !== null && !seconds.ok) throw new Invalid({ length: seconds.error });
  return {
    address,
    durationFrames: seconds === null ? null : Math.round(seconds.value * MILLISECONDS.rateNum),
    ...MILLISECONDS,
  };
}
