import { and, eq, ne, or } from 'drizzle-orm';
import { notes } from '../../../db/schema/notes.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { findDraftView } from './episode-view.ts';
import { loadNotes, ofDesk } from './load-notes.ts';

/** The notes of an episode that the reader may see: what is asked of one person is for them, who asked, and the owner. */
export const listNotes = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { db, actor, role } = context;
  const episode = await loadEpisodeOfNotes(context, ref);
  const others = ne(notes.audience, 'person');
  const mine =
    actor.kind === 'account'
      ? or(others, eq(notes.askedId, actor.id), eq(notes.writtenBy, actor.id))
      : others;
  const view = await findDraftView(db, episode.id);
  const items = await loadNotes(db, view, and(ofDesk(view), role === 'owner' ? undefined : mine));
  return { items, nextCursor: null };
});
