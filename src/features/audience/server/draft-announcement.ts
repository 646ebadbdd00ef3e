import { eq } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { announcements } from '../../../db/schema/audience.ts';
import { may } from '../../../domain/permissions.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';
import { lockForAnnouncing } from './load-announcement.ts';

/**
 * Keeps the words of an announcement. From an editor it asks the owner to send it.
 * @throws Invalid when the episode cannot be announced, or is being announced; Conflict
 */
export const draftAnnouncement = verb(
  { may: 'announcement.ask-to-send' },
  async (context, input: EpisodeRef & { readonly words: string; readonly version: number }) => {
    const { db, workshop, role, actor, now } = context;
    const { episode, edition, announcement } = await lockForAnnouncing(context, input);
    if (announcement && announcement.state !== 'draft') {
      throw new Invalid({ '': 'It is on its way already; its words stay as they are.' });
    }
    const asks = !may(role, 'announcement.send') && actor.kind === 'account';
    const set = {
      words: input.words,
      editionId: edition.id,
      ...(asks && { askedBy: actor.id, askedAt: now }),
      updatedAt: now,
    };
    if (announcement) {
      await db
        .update(announcements)
        .set({ ...set, version: announcement.version + 1 })
        .where(eq(announcements.id, announcement.id));
      return { id: announcement.id };
    }
    const id = newId();
    await onUniqueViolation(
      {
        announcements_open_unique: {
          '': 'Someone else began this announcement just now. Open the page again.',
        },
      },
      () => db.insert(announcements).values({ id, workshopId: workshop.id, episodeId: episode.id, ...set }),
    );
    return { id };
  },
);
