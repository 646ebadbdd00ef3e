import { and, desc, eq, ne, sql } from 'drizzle-orm';
import { announcements, messages } from '../../../db/schema/audience.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';

/** Something that differs whenever the progress of an episode's announcement does. @throws NotFound */
export const getProgressTag = read(
  { may: 'announcement.ask-to-send' },
  async ({ db, workshop }, ref: EpisodeRef): Promise<string> => {
    // By itself, so that it is one look at the end of an index.
    const newest = db
      .select({ at: messages.updatedAt })
      .from(messages)
      .where(eq(messages.announcementId, announcements.id))
      .orderBy(desc(messages.updatedAt))
      .limit(1);
    const [row] = await db
      .select({
        version: announcements.version,
        state: announcements.state,
        at: sql<string | null>`(${newest})::text`,
      })
      .from(announcements)
      .where(
        and(
          eq(announcements.workshopId, workshop.id),
          eq(announcements.episodeId, ref.episode),
          ne(announcements.state, 'cancelled'),
        ),
      );
    if (!row) throw new NotFound('This announcement');
    return `${String(row.version)}-${row.state}-${row.at?.replaceAll(/\D/g, '') ?? ''}`;
  },
);
