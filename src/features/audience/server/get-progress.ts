import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisode } from '../../episodes/server/load-episode.ts';
import { countMessages } from './count-messages.ts';
import { findAnnouncement } from './load-announcement.ts';

/** How far the announcement of an episode has come. @throws NotFound before there is one */
export const getProgress = read({ may: 'announcement.ask-to-send' }, async (context, ref: EpisodeRef) => {
  const { episode } = await loadEpisode(context, ref);
  const announcement = await findAnnouncement(context.db, episode.id);
  if (!announcement) throw new NotFound('This announcement');
  return countMessages(context.db, announcement);
});
