import { read } from '../../../server/verb.ts';
import { listAppearances } from '../../notes/server/list-appearances.ts';
import { listNotes } from '../../notes/server/list-notes.ts';
import { type DeskLists } from '../desk.ts';
import { listChapters } from './list-chapters.ts';
import { listPublishChecks } from './list-publish-checks.ts';
import { type EpisodeRef } from './load-episode.ts';

/** Everything on an episode's desk that others may change while it is open, as its reader may see it. */
export const lookAtDesk = read(
  { may: 'workshop.see-bench' },
  async (context, ref: EpisodeRef): Promise<DeskLists> => ({
    notes: (await listNotes(context, ref)).items,
    chapters: (await listChapters(context, ref)).items,
    appearances: (await listAppearances(context, ref)).items,
    checks: (await listPublishChecks(context, ref)).items.map(({ place, ...check }) => ({
      ...check,
      place: { ...place, ids: [...place.ids] },
    })),
  }),
);
