import { and, asc, eq, isNull } from 'drizzle-orm';
import { episodeNumbers, episodes } from '../../../db/schema/episodes.ts';
import { type Database } from '../../../db/client.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { findShownView } from '../../notes/server/episode-view.ts';
import { loadChapters } from './load-chapters.ts';
import { findShownEdition } from './load-editions.ts';

interface Ref {
  readonly build: string;
  readonly number: number;
}

/**
 * A published episode as everyone sees it: its shown edition with video, captions and chapters, and its neighbours.
 * `episode.number` is the current one, whatever old number was asked for.
 * @throws NotFound unless an edition of it is on show in a public build
 */
export const getPublicEpisode = read({ may: 'published.read' }, (context, ref: Ref) =>
  loadPublicEpisode(context, ref),
);

async function loadPublicEpisode(context: WorkshopContext, ref: Ref) {
  const { db } = context;
  const build = await loadBuild(context, ref.build);
  if (build.visibility !== 'public') throw new NotFound('This episode');
  const [row] = await db
    .select({ episode: episodes })
    .from(episodeNumbers)
    .innerJoin(episodes, eq(episodes.id, episodeNumbers.episodeId))
    .where(
      and(
        eq(episodeNumbers.buildId, build.id),
        eq(episodeNumbers.number, ref.number),
        eq(episodes.state, 'published'),
        isNull(episodes.deletedAt),
      ),
    );
  const shown = row ? await findShownEdition(db, row.episode.id) : null;
  if (!row || !shown) throw new NotFound('This episode');
  const { episode } = row;
  const published = await loadPublished(db, build.id);
  const here = published.findIndex(({ id }) => id === episode.id);
  return {
    build,
    episode,
    edition: shown,
    chapters: await loadChapters(db, await findShownView(db, episode.id)),
    previous: published[here - 1] ?? null,
    next: published[here + 1] ?? null,
    /** How many episodes the series has or plans, whichever is more. */
    of: Math.max(build.plannedEpisodes ?? 0, ...published.map(({ number }) => number)),
  };
}

async function loadPublished(db: Database, buildId: string) {
  return db
    .select({ id: episodes.id, number: episodes.number, title: episodes.title })
    .from(episodes)
    .where(and(eq(episodes.buildId, buildId), eq(episodes.state, 'published'), isNull(episodes.deletedAt)))
    .orderBy(asc(episodes.number));
}
