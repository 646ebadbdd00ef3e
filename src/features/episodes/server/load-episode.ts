import { and, desc, eq, isNull } from 'drizzle-orm';
import { captions, episodes, videos } from '../../../db/schema/episodes.ts';
import { type Database } from '../../../db/client.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type Video } from '../episode.ts';

/** What names an episode on the bench: its build's address name and its id. */
export interface EpisodeRef {
  readonly build: string;
  readonly episode: string;
}

/** An episode with its build. @throws NotFound */
export async function loadEpisode(context: WorkshopContext, ref: EpisodeRef) {
  const build = await loadBuild(context, ref.build);
  const [episode] = await context.db
    .select()
    .from(episodes)
    .where(and(eq(episodes.id, ref.episode), eq(episodes.buildId, build.id), isNull(episodes.deletedAt)));
  if (!episode) throw new NotFound('This episode');
  return { build, episode };
}

/**
 * The same, locked for the change that follows.
 * @throws Conflict with the stored episode when it is not at the version that the change names
 */
export async function lockEpisode(context: WorkshopContext, ref: EpisodeRef & { readonly version: number }) {
  const { build } = await loadEpisode(context, ref);
  const [episode] = await context.db
    .select()
    .from(episodes)
    .where(and(eq(episodes.id, ref.episode), isNull(episodes.deletedAt)))
    .for('update');
  if (!episode) throw new NotFound('This episode');
  if (episode.version !== ref.version) throw new Conflict(episode);
  return { build, episode };
}

/** The video that the next edition would show: the newest. */
export async function findDraftVideo(db: Database, episodeId: string): Promise<Video | null> {
  const [row] = await db
    .select()
    .from(videos)
    .where(eq(videos.episodeId, episodeId))
    .orderBy(desc(videos.id))
    .limit(1);
  return row ? presentVideo(row) : null;
}

/** The captions that the next edition would show: the newest. */
export async function findDraftCaptions(db: Database, episodeId: string) {
  const [row] = await db
    .select({
      id: captions.id,
      number: captions.number,
      language: captions.language,
      cueCount: captions.cueCount,
      sourceName: captions.sourceName,
      webvtt: captions.webvtt,
    })
    .from(captions)
    .where(eq(captions.episodeId, episodeId))
    .orderBy(desc(captions.number))
    .limit(1);
  return row ?? null;
}

export function presentVideo(row: typeof videos.$inferSelect): Video {
  const { id, fileId, address, durationFrames, rateNum, rateDen } = row;
  return {
    id,
    fileId,
    address,
    seconds: durationFrames === null ? null : (durationFrames * rateDen) / rateNum,
    rate: { num: rateNum, den: rateDen },
  };
}
