import { and, eq, isNull } from 'drizzle-orm';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { findDraftView, mainPlace, writtenAt } from './episode-view.ts';
import { announceNotes } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';

type Target = EpisodeRef & { readonly appearance: string };

/** Takes a part that was set by hand off the bench again. */
export const removeAppearance = verb({ may: 'draft-note.change' }, async (context, input: Target) => {
  const { db, workshop, now } = context;
  const episode = await loadEpisodeOfNotes(context, input);
  const view = await findDraftView(db, episode.id);
  const [found] = await db
    .select({ id: appearances.id, anchorId: appearances.anchorId })
    .from(appearances)
    .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
    .leftJoin(places, mainPlace(view))
    .where(
      and(
        eq(appearances.id, input.appearance),
        eq(appearances.workshopId, workshop.id),
        writtenAt(view),
        isNull(appearances.deletedAt),
      ),
    );
  if (!found) throw new NotFound('This part in view');
  await db.update(appearances).set({ deletedAt: now }).where(eq(appearances.id, found.id));
  await announceNotes(context, episode, found.anchorId);
  return { id: found.id };
});
