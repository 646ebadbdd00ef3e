import { and, eq, exists, isNull, lte, ne, or, type SQL } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { builds } from '../../../db/schema/builds.ts';
import { diaryEntries, diaryPhotos } from '../../../db/schema/diary.ts';
import { editions, episodes, videos } from '../../../db/schema/episodes.ts';
import { files } from '../../../db/schema/files.ts';

/** Whether a file is shown to everyone: in what viewers see of an episode, or in a public diary entry. */
export function isShownToEveryone(db: Database, now: Date): SQL | undefined {
  const inEdition = db
    .select({ id: editions.id })
    .from(editions)
    .innerJoin(videos, eq(videos.id, editions.videoId))
    .innerJoin(episodes, eq(episodes.id, editions.episodeId))
    .where(
      and(
        eq(videos.fileId, files.id),
        isNull(editions.replacedAt),
        isNull(editions.withdrawnAt),
        lte(editions.publishedAt, now),
        isNull(episodes.deletedAt),
        ne(episodes.state, 'withdrawn'),
      ),
    );
  const inDiary = db
    .select({ id: diaryEntries.id })
    .from(diaryPhotos)
    .innerJoin(diaryEntries, eq(diaryEntries.id, diaryPhotos.entryId))
    .where(
      and(
        eq(diaryPhotos.fileId, files.id),
        eq(diaryEntries.visibility, 'public'),
        isNull(diaryEntries.deletedAt),
      ),
    );
  return and(
    eq(builds.visibility, 'public'),
    isNull(builds.deletedAt),
    isNull(files.deletedAt),
    or(exists(inEdition), exists(inDiary)),
  );
}
