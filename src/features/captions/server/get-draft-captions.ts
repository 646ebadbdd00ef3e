import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef, findDraftCaptions, loadEpisode } from '../../episodes/server/load-episode.ts';

/** The newest captions of an episode, as its desk and preview play them. @throws NotFound */
export const getDraftCaptions = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { episode } = await loadEpisode(context, ref);
  const captions = await findDraftCaptions(context.db, episode.id);
  if (!captions) throw new NotFound('The captions');
  return captions;
});
