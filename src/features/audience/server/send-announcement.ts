import { eq, sql } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { type Database } from '../../../db/client.ts';
import { announcements, messages } from '../../../db/schema/audience.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';
import { type SendAnnouncement } from '../audience.ts';
import { contentOf, isOldNews, lockForAnnouncing, previewOf, selectRecipients } from './load-announcement.ts';

/** Rows put in by one statement; PostgreSQL takes 65535 parameters. */
const ROWS_AT_ONCE = 1_000;

/**
 * Sends the announcement of a published episode: fixes who is mailed and under which Message-ID, and leaves the rest
 * to the workers.
 * @throws Invalid when it cannot be announced, the mail is not the one that was shown, or a question before it was
 *   not answered; Conflict
 */
export const sendAnnouncement = verb(
  { may: 'announcement.send' },
  async (context, input: EpisodeRef & SendAnnouncement) => {
    const { db, workshop, actor, now, services } = context;
    const { build, episode, edition, announcement } = await lockForAnnouncing(context, input);
    if (announcement && announcement.state !== 'draft') {
      throw new Invalid({ '': `The announcement is ${announcement.state} already. Nobody is mailed twice.` });
    }
    if (edition.video.address !== null && !input.watchable) {
      throw new Invalid({ watchable: 'Look whether the video can be watched where it is, then tick this.' });
    }
    if (isOldNews(context, episode.publishedOn) && !input.late) {
      throw new Invalid({
        late: 'It came out more than a week ago. Tick this if it is to be mailed all the same.',
      });
    }
    const content = contentOf(context, build, episode, announcement?.words ?? '');
    if (previewOf(content, services.settings.PUBLIC_URL).seen !== input.seen) {
      throw new Invalid({
        '': 'The mail has changed since you saw it. Look at it again; nobody was mailed.',
      });
    }
    const recipients = await selectRecipients(db, {
      workshopId: workshop.id,
      buildId: build.id,
      episodeId: episode.id,
    });
    if (recipients.length === 0) throw new Invalid({ '': 'There is nobody to mail.' });
    const id = announcement?.id ?? newId();
    const set = {
      state: 'sending' as const,
      editionId: edition.id,
      content,
      sentBy: actor.kind === 'account' ? actor.id : null,
      startedAt: now,
      updatedAt: now,
    };
    if (announcement) {
      await db
        .update(announcements)
        .set({ ...set, version: announcement.version + 1 })
        .where(eq(announcements.id, id));
    } else {
      await onUniqueViolation(
        { announcements_open_unique: { '': 'It is being sent already. Nobody is mailed twice.' } },
        () => db.insert(announcements).values({ id, workshopId: workshop.id, episodeId: episode.id, ...set }),
      );
    }
    const host = new URL(services.settings.PUBLIC_URL).hostname;
    await fixList(db, { workshopId: workshop.id, announcementId: id, host }, recipients);
    await services.jobs.enqueue(db, 'announcement-started', { announcementId: id });
    return { id };
  },
);

async function fixList(
  db: Database,
  of: {
    readonly workshopId: string;
    readonly announcementId: string;
    readonly host: string;
  },
  recipients: readonly { readonly id: string }[],
): Promise<void> {
  const { workshopId, announcementId, host } = of;
  for (let from = 0; from < recipients.length; from += ROWS_AT_ONCE) {
    await db.insert(messages).values(
      recipients.slice(from, from + ROWS_AT_ONCE).map((subscriber) => {
        const id = newId();
        return {
          id,
          workshopId,
          announcementId,
          subscriberId: subscriber.id,
          messageId: `<message.${id}@${host}>`,
          // The workers go by the database's clock.
          notBefore: sql`now()`,
        };
      }),
    );
  }
}
