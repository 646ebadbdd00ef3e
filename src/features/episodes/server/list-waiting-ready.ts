import { and, asc, eq, isNull } from 'drizzle-orm';
import { buildSlugs } from '../../../db/schema/builds.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { may } from '../../../domain/permissions.ts';
import { type Waiting } from '../../../domain/waiting.ts';
import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';

/** The episodes that wait for the owner to publish them. */
export const listWaitingReady = read(
  { may: 'workshop.see-bench' },
  async ({ db, workshop, role }): Promise<readonly Waiting[]> => {
    if (!may(role, 'episode.publish')) return [];
    const rows = await db
      .select({ id: episodes.id, number: episodes.number, title: episodes.title, build: buildSlugs.slug })
      .from(episodes)
      .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, episodes.buildId), eq(buildSlugs.current, true)))
      .where(
        and(eq(episodes.workshopId, workshop.id), eq(episodes.state, 'ready'), isNull(episodes.deletedAt)),
      )
      .orderBy(asc(episodes.readyAskedAt));
    return rows.map((row) => ({
      urgency: 'now',
      what: `Episode ${String(row.number)}, ${row.title}, is ready. Look it over and publish it.`,
      href: paths.publish(workshop.slug, row.build, row.id),
      due: null,
    }));
  },
);
