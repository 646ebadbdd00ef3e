import { verb } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';
import { moveAnnouncement } from './load-announcement.ts';

/** Holds an announcement back; the mail in flight still goes. @throws NotFound, Conflict, Invalid */
export const pauseAnnouncement = verb(
  { may: 'announcement.send' },
  async (context, input: EpisodeRef & { readonly version: number }) => ({
    id: await moveAnnouncement(context, input, 'paused'),
  }),
);
