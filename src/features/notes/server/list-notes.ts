import { eq, or, sql } from 'drizzle-orm';
import { notes } from '../../../db/schema/notes.ts';
import { read } from '../../../server/verb.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { loadNotes, ofEpisode } from './load-notes.ts';

/** The notes of an episode that the reader may see: what is asked of one person is for them, who asked, and the owner. */
export const listNotes = read({ may: 'workshop.see-bench' }, async (context, ref: EpisodeRef) => {
  const { db, actor, role } = context;
  const episode = await loadEpisodeOfNotes(context, ref);
  const reader = actor.kind === 'account' ? actor.id : null;
  const mine = or(
    sql`${notes.audience} <> 'person'`,
    eq(notes.askedId, reader ?? ''),
    eq(notes.writtenBy, reader ?? ''),
  );
  const items = await loadNotes(db, sql`${ofEpisode(episode.id)} and ${role === 'owner' ? sql`true` : mine}`);
  return { items, nextCursor: null };
});
