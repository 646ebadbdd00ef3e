import { verb } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';
import { loadForAnnouncing, moveAnnouncement } from './load-announcement.ts';

/** Goes on with an announcement that was held back. @throws NotFound, Conflict, Invalid when nobody could see the episode */
export const resumeAnnouncement = verb(
  { may: 'announcement.send' },
  async (context, input: EpisodeRef & { readonly version: number }) => {
    const id = await moveAnnouncement(context, input, 'sending');
    await loadForAnnouncing(context, input);
    await context.services.jobs.enqueue(context.db, 'announcement-started', { announcementId: id });
    return { id };
  },
);
