import { and, eq, isNull } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { captions, editions, videos } from '../../../db/schema/episodes.ts';
import { presentVideo } from './load-episode.ts';

/** The edition of an episode that viewers see now, with its video and captions; null when there is none. */
export async function findShownEdition(db: Database, episodeId: string) {
  const [row] = await db
    .select({ edition: editions, video: videos, captions })
    .from(editions)
    .innerJoin(videos, eq(videos.id, editions.videoId))
    .leftJoin(captions, eq(captions.id, editions.captionsId))
    .where(and(eq(editions.episodeId, episodeId), isNull(editions.replacedAt), isNull(editions.withdrawnAt)));
  if (!row) return null;
  const { edition, video } = row;
  return {
    id: edition.id,
    number: edition.number,
    publishedAt: edition.publishedAt,
    backCatalogue: edition.backCatalogue,
    video: presentVideo(video),
    captions: row.captions,
  };
}
