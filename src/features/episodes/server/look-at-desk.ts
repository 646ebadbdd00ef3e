import { read } from '../../../server/verb.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { findDraftView } from '../../notes/server/episode-view.ts';
import { listAppearances } from '../../notes/server/list-appearances.ts';
import { listNotes } from '../../notes/server/list-notes.ts';
import { type DeskLists } from '../desk.ts';
import { listChapters } from './list-chapters.ts';
import { listPublishChecks } from './list-publish-checks.ts';
import { type EpisodeRef, loadEpisode } from './load-episode.ts';
import { loadOffCamera } from './load-off-camera.ts';

/** Everything on an episode's desk that others may change while it is open, as its reader may see it. */
export const lookAtDesk = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef): Promise<DeskLists> => ({
    notes: (await listNotes(context, ref)).items,
    chapters: (await listChapters(context, ref)).items,
    appearances: (await listAppearances(context, ref)).items,
    offCamera: await loadDeskOffCamera(context, ref),
    checks: (await listPublishChecks(context, ref)).items.map(({ place, ...check }) => ({
      ...check,
      place: { ...place, ids: [...place.ids] },
    })),
  }),
);

async function loadDeskOffCamera(context: WorkshopContext, ref: EpisodeRef) {
  const { db, now } = context;
  const { build, episode } = await loadEpisode(context, ref);
  const cuts = await loadOffCamera(db, build.id, await findDraftView(db, episode.id), now);
  return cuts.map((cut) => ({ ...cut, texts: [...cut.texts] }));
}
