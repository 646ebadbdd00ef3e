import { and, eq, isNull } from 'drizzle-orm';
import { notes } from '../../../db/schema/notes.ts';
import { read } from '../../../server/verb.ts';
import { findShownView, shownToViewers } from './episode-view.ts';
import { loadNotes } from './load-notes.ts';

/** The notes of a published episode that viewers see. @param episodeId of an episode that was found to be on show */
export const listShownNotes = read(
  { may: 'published.read' },
  async ({ db, workshop }, { episodeId }: { episodeId: string }) => {
    const view = await findShownView(db, episodeId);
    const items = await loadNotes(
      db,
      view,
      and(
        shownToViewers(view),
        isNull(notes.deletedAt),
        eq(notes.workshopId, workshop.id),
        eq(notes.audience, 'viewers'),
        eq(notes.proposed, false),
      ),
    );
    return { items, nextCursor: null };
  },
);
