import { and, eq, isNull } from 'drizzle-orm';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { announceNotes } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';

type Target = EpisodeRef & { readonly appearance: string };

/** Takes a part that was set by hand off the bench again. */
export const removeAppearance = verb({ may: 'draft-note.change' }, async (context, input: Target) => {
  const { db, workshop, now } = context;
  const episode = await loadEpisodeOfNotes(context, input);
  const [found] = await db
    .select({ id: appearances.id })
    .from(appearances)
    .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
    .where(
      and(
        eq(appearances.id, input.appearance),
        eq(appearances.workshopId, workshop.id),
        eq(anchors.episodeId, episode.id),
        isNull(appearances.deletedAt),
      ),
    );
  if (!found) throw new NotFound('This part in view');
  await db.update(appearances).set({ deletedAt: now }).where(eq(appearances.id, found.id));
  await announceNotes(context, episode);
  return { id: found.id };
});
