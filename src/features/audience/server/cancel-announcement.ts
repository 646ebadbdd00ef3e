import { verb } from '../../../server/verb.ts';
import { type EpisodeRef } from '../../episodes/server/load-episode.ts';
import { moveAnnouncement } from './load-announcement.ts';

/**
 * Calls an announcement off; whoever was mailed was mailed, and is not mailed again by the next one.
 * @throws NotFound, Conflict, Invalid
 */
export const cancelAnnouncement = verb(
  { may: 'announcement.send' },
  async (context, input: EpisodeRef & { readonly version: number }) => ({
    id: await moveAnnouncement(context, input, 'cancelled'),
  }),
);
