import { read } from '../../../server/verb.ts';
import { loadDraftChapters } from './load-chapters.ts';
import { type EpisodeRef, findDraftCaptions, findDraftVideo, loadEpisode } from './load-episode.ts';
import { findShownEdition } from './load-editions.ts';

/** An episode as its desk needs it: with its draft's video, captions and chapters, and what viewers see now. */
export const getDesk = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { db } = context;
  const { build, episode } = await loadEpisode(context, ref);
  return {
    build,
    episode,
    video: await findDraftVideo(db, episode.id),
    captions: await findDraftCaptions(db, episode.id),
    chapters: await loadDraftChapters(db, episode.id),
    shown: await findShownEdition(db, episode.id),
  };
});
