import { and, asc, eq, isNotNull, isNull } from 'drizzle-orm';
import { announcements } from '../../../db/schema/audience.ts';
import { buildSlugs } from '../../../db/schema/builds.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { may } from '../../../domain/permissions.ts';
import { type Waiting } from '../../../domain/waiting.ts';
import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';

/** The announcements that an editor asks the owner to send. */
export const listWaitingAnnouncements = read(
  { may: 'workshop.see-bench' },
  async ({ db, workshop, role }): Promise<readonly Waiting[]> => {
    if (!may(role, 'announcement.send')) return [];
    const rows = await db
      .select({ id: episodes.id, number: episodes.number, build: buildSlugs.slug })
      .from(announcements)
      .innerJoin(episodes, eq(episodes.id, announcements.episodeId))
      .innerJoin(buildSlugs, and(eq(buildSlugs.buildId, episodes.buildId), eq(buildSlugs.current, true)))
      .where(
        and(
          eq(announcements.workshopId, workshop.id),
          eq(announcements.state, 'draft'),
          isNotNull(announcements.askedAt),
          eq(episodes.state, 'published'),
          isNull(episodes.deletedAt),
        ),
      )
      .orderBy(asc(announcements.askedAt));
    return rows.map((row) => ({
      urgency: 'soon',
      what: `The announcement of episode ${String(row.number)} is written. Look it over and send it.`,
      href: paths.announcement(workshop.slug, row.build, row.id),
      due: null,
    }));
  },
);
