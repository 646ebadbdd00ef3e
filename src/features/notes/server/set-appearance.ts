import { and, eq } from 'drizzle-orm';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { type Position } from '../../../domain/positions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type Appearance } from '../note.ts';
import { announceNotes } from './guard-published.ts';
import { type EpisodeOfNotes, type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { anchorAt, makeAnchor, requireKnown } from './write-note.ts';

type Input = EpisodeRef & { readonly id: string; readonly partId: string; readonly position: Position };

/**
 * Puts a part on the bench by hand, from one moment to another; one that was taken off with this id comes back.
 * @throws Invalid without an end, or for an unknown part
 */
export const setAppearance = verb(
  { may: 'draft-note.change' },
  async (context, input: Input): Promise<Appearance> => {
    const { id, partId, position } = input;
    const episode = await loadEpisodeOfNotes(context, input);
    if (position.endFrame === null) throw new Invalid({ position: 'Say until when the part is in view.' });
    await requireKnown(context, episode, { partIds: [partId], audience: 'team', askedId: null });
    const version = (await setAgain(context, episode, input)) ?? (await setFirst(context, episode, input));
    await announceNotes(context, episode);
    return { id, version, partId, position };
  },
);

async function setAgain(
  { db, workshop, now }: WorkshopContext,
  episode: EpisodeOfNotes,
  { id, partId, position }: Input,
): Promise<number | null> {
  const [known] = await db
    .select({ version: appearances.version, anchorId: appearances.anchorId })
    .from(appearances)
    .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
    .where(
      and(eq(appearances.id, id), eq(appearances.workshopId, workshop.id), eq(anchors.episodeId, episode.id)),
    )
    .for('update', { of: appearances });
  if (!known) return null;
  const version = known.version + 1;
  await db.update(anchors).set(anchorAt(position)).where(eq(anchors.id, known.anchorId));
  await db
    .update(appearances)
    .set({ partId, version, deletedAt: null, updatedAt: now })
    .where(eq(appearances.id, id));
  return version;
}

async function setFirst(
  context: WorkshopContext,
  episode: EpisodeOfNotes,
  { id, partId, position }: Input,
): Promise<number> {
  const anchorId = await makeAnchor(context, episode, position);
  await onUniqueViolation(
    { appearances_pkey: { id: 'This is kept elsewhere already. Open the page again.' } },
    () => context.db.insert(appearances).values({ id, workshopId: context.workshop.id, anchorId, partId }),
  );
  return 1;
}
