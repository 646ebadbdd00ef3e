import { read } from '../../../server/verb.ts';
import { loadAppearances } from './load-appearances.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';

/** The parts set by hand on an episode's bench. */
export const listAppearances = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const episode = await loadEpisodeOfNotes(context, ref);
  return { items: await loadAppearances(context.db, context.workshop.id, episode.id), nextCursor: null };
});

/** The same of an episode that is on show. @param episodeId of an episode that was found to be on show */
export const listShownAppearances = read(
  { may: 'published.read' },
  async ({ db, workshop }, { episodeId }: { episodeId: string }) => ({
    items: await loadAppearances(db, workshop.id, episodeId),
    nextCursor: null,
  }),
);
