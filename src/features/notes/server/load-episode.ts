import { and, eq, isNull } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** What names an episode: its build's address name and its id. */
export interface EpisodeRef {
  readonly build: string;
  readonly episode: string;
}

/**
 * The episode that notes are kept on.
 * @throws NotFound
 */
export async function loadEpisodeOfNotes(context: WorkshopContext, ref: EpisodeRef) {
  const build = await loadBuild(context, ref.build);
  const [episode] = await context.db
    .select({ id: episodes.id, buildId: episodes.buildId, state: episodes.state })
    .from(episodes)
    .where(and(eq(episodes.id, ref.episode), eq(episodes.buildId, build.id), isNull(episodes.deletedAt)));
  if (!episode) throw new NotFound('This episode');
  return episode;
}

export type EpisodeOfNotes = Awaited<ReturnType<typeof loadEpisodeOfNotes>>;
