import { read } from '../../../server/verb.ts';
import { findDraftView, findShownView, shownToViewers, toldIn } from './episode-view.ts';
import { loadAppearances } from './load-appearances.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';

/** The parts set by hand on an episode's bench. */
export const listAppearances = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const episode = await loadEpisodeOfNotes(context, ref);
  const { db, workshop } = context;
  const view = await findDraftView(db, episode.id);
  return { items: await loadAppearances(db, workshop.id, view, toldIn(view)), nextCursor: null };
});

/** The same of an episode that is on show. @param episodeId of an episode that was found to be on show */
export const listShownAppearances = read(
  { may: 'published.read' },
  async ({ db, workshop }, { episodeId }: { episodeId: string }) => {
    const view = await findShownView(db, episodeId);
    return { items: await loadAppearances(db, workshop.id, view, shownToViewers(view)), nextCursor: null };
  },
);
