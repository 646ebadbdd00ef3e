import { and, desc, eq, isNull, sql } from 'drizzle-orm';
import { builds, buildSlugs } from '../../../db/schema/builds.ts';
import { captions, editions, episodes, videos } from '../../../db/schema/episodes.ts';
import { read } from '../../../server/verb.ts';
import { presentVideo } from './load-episode.ts';

/**
 * The published episodes of a workshop's public builds, newest first.
 * @param input.buildId only of this build
 * @param input.limit at most so many
 */
export const listPublicEpisodes = read(
  { may: 'published.read' },
  async ({ db, workshop }, input: { readonly buildId?: string; readonly limit?: number }) => {
    const rows = await db
      .select({
        id: episodes.id,
        number: episodes.number,
        title: episodes.title,
        about: episodes.about,
        publishedOn: episodes.publishedOn,
        build: { id: builds.id, slug: buildSlugs.slug, name: builds.name },
        edition: editions,
        video: videos,
        captionsId: captions.id,
      })
      .from(editions)
      .innerJoin(episodes, eq(episodes.id, editions.episodeId))
      .innerJoin(builds, and(eq(builds.id, episodes.buildId), eq(builds.visibility, 'public')))
      .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, builds.id), eq(buildSlugs.current, true)))
      .innerJoin(videos, eq(videos.id, editions.videoId))
      .leftJoin(captions, eq(captions.id, editions.captionsId))
      .where(
        and(
          eq(editions.workshopId, workshop.id),
          isNull(editions.replacedAt),
          isNull(editions.withdrawnAt),
          eq(episodes.state, 'published'),
          isNull(episodes.deletedAt),
          isNull(builds.deletedAt),
          input.buildId === undefined ? undefined : eq(builds.id, input.buildId),
        ),
      )
      .orderBy(sql`${episodes.publishedOn} desc nulls last`, desc(episodes.number))
      .limit(input.limit ?? 500);
    return { items: rows.map((row) => ({ ...row, video: presentVideo(row.video) })), nextCursor: null };
  },
);
