import { count, eq } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { type Database } from '../../../db/client.ts';
import { read } from '../../../server/verb.ts';
import { findShownEdition } from '../../episodes/server/load-editions.ts';
import { type EpisodeRef, loadEpisode } from '../../episodes/server/load-episode.ts';
import { countMessages } from './count-messages.ts';
import {
  contentOf,
  findAnnouncement,
  isOldNews,
  previewOf,
  refusalToAnnounce,
  selectRecipients,
} from './load-announcement.ts';

/**
 * The announcement of an episode as its page on the bench shows it: what the mail says, who gets it, what is to be
 * answered first, how far it has come. No addresses.
 * @throws NotFound
 */
export const getAnnouncement = read({ may: 'announcement.ask-to-send' }, async (context, ref: EpisodeRef) => {
  const { db, workshop, services } = context;
  const { build, episode } = await loadEpisode(context, ref);
  const edition = await findShownEdition(db, episode.id);
  const announcement = await findAnnouncement(db, episode.id);
  const words = announcement?.words ?? '';
  const content = announcement?.content ?? contentOf(context, build, episode, words);
  const recipients = selectRecipients(db, {
    workshopId: workshop.id,
    buildId: build.id,
    episodeId: episode.id,
  }).as('recipients');
  const [waiting] = await db.select({ count: count() }).from(recipients);
  return {
    build,
    episode: {
      id: episode.id,
      number: episode.number,
      title: episode.title,
      publishedOn: episode.publishedOn,
    },
    refusal: refusalToAnnounce(build, episode, edition),
    elsewhere: edition?.video.address ?? null,
    late: isOldNews(context, episode.publishedOn),
    state: announcement?.state ?? null,
    version: announcement?.version ?? 0,
    words,
    askedBy: announcement?.askedBy ? await nameOf(db, announcement.askedBy) : null,
    recipients: waiting?.count ?? 0,
    mail: previewOf(content, services.settings.PUBLIC_URL),
    progress: announcement ? await countMessages(db, announcement) : null,
  };
});

async function nameOf(db: Database, accountId: string): Promise<string | null> {
  const [row] = await db.select({ name: accounts.name }).from(accounts).where(eq(accounts.id, accountId));
  return row?.name ?? null;
}
