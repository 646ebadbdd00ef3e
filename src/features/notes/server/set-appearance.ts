import { and, eq } from 'drizzle-orm';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { places } from '../../../db/schema/places.ts';
import { type Position } from '../../../domain/positions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type Appearance } from '../note.ts';
import { type EpisodeView, findDraftView, mainPlace, standsAt, writtenAt } from './episode-view.ts';
import { announceNotes } from './guard-published.ts';
import { loadAppearances } from './load-appearances.ts';
import { type EpisodeOfNotes, type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { makeAnchor, moveAnchor } from './write-anchor.ts';
import { requireKnown } from './write-note.ts';

type Input = EpisodeRef & { readonly id: string; readonly partId: string; readonly position: Position };

/**
 * Puts a part on the bench by hand, from one moment to another; one that was taken off with this id comes back.
 * @throws Invalid without an end, or for an unknown part
 */
export const setAppearance = verb(
  { may: 'draft-note.change' },
  async (context, input: Input): Promise<Appearance> => {
    const { db, workshop } = context;
    const { id, partId, position } = input;
    const episode = await loadEpisodeOfNotes(context, input);
    if (position.endFrame === null) throw new Invalid({ position: 'Say until when the part is in view.' });
    await requireKnown(context, episode, { partIds: [partId], audience: 'team', askedId: null });
    const view = await findDraftView(db, episode.id);
    if (!(await setAgain(context, view, episode, input))) await setFirst(context, episode, input);
    await announceNotes(context, episode);
    const [kept] = await loadAppearances(db, workshop.id, view, eq(appearances.id, id));
    if (!kept) throw new Error('The part in view was not kept.');
    return kept;
  },
);

async function setAgain(
  context: WorkshopContext,
  view: EpisodeView,
  episode: EpisodeOfNotes,
  { id, partId, position }: Input,
): Promise<boolean> {
  const { db, workshop, now } = context;
  const [known] = await db
    .select({ version: appearances.version, anchor: anchors, place: places })
    .from(appearances)
    .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
    .leftJoin(places, mainPlace(view))
    .where(and(eq(appearances.id, id), eq(appearances.workshopId, workshop.id), writtenAt(view)))
    .for('update', { of: appearances });
  if (!known) return false;
  const { anchor, place } = known;
  const isShown = view.edit === null || place?.frame != null;
  const stands = isShown ? standsAt(view, anchor, place) : null;
  await moveAnchor(context, episode, anchor.id, position, stands);
  await db
    .update(appearances)
    .set({ partId, version: known.version + 1, deletedAt: null, updatedAt: now })
    .where(eq(appearances.id, id));
  return true;
}

async function setFirst(
  context: WorkshopContext,
  episode: EpisodeOfNotes,
  { id, partId, position }: Input,
): Promise<void> {
  const anchorId = await makeAnchor(context, episode, position);
  await onUniqueViolation(
    { appearances_pkey: { id: 'This is kept elsewhere already. Open the page again.' } },
    () => context.db.insert(appearances).values({ id, workshopId: context.workshop.id, anchorId, partId }),
  );
}
