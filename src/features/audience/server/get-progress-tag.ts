import { and, desc, eq, ne } from 'drizzle-orm';
import { announcements, messages } from '../../../db/schema/audience.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';

/** Something that differs whenever the progress of an episode's announcement does. @throws NotFound */
export const getProgressTag = read(
  { may: 'announcement.ask-to-send' },
  async ({ db, workshop }, ref: EpisodeRef): Promise<string> => {
    const [row] = await db
      .select({ version: announcements.version, state: announcements.state, at: messages.updatedAt })
      .from(announcements)
      .leftJoin(messages, eq(messages.announcementId, announcements.id))
      .where(
        and(
          eq(announcements.workshopId, workshop.id),
          eq(announcements.episodeId, ref.episode),
          ne(announcements.state, 'cancelled'),
        ),
      )
      .orderBy(desc(messages.updatedAt))
      .limit(1);
    if (!row) throw new NotFound('This announcement');
    return `${String(row.version)}-${row.state}-${String(row.at?.getTime() ?? 0)}`;
  },
);
