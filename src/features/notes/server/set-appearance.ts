import { eq } from 'drizzle-orm';
import { anchors, appearances } from '../../../db/schema/notes.ts';
import { type Position } from '../../../domain/positions.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type Appearance } from '../note.ts';
import { announceNotes } from './guard-published.ts';
import { type EpisodeRef, loadEpisodeOfNotes } from './load-episode.ts';
import { makeAnchor, requireKnown } from './write-note.ts';

type Input = EpisodeRef & { readonly id: string; readonly partId: string; readonly position: Position };

/** Puts a part on the bench by hand, from one moment to another. @throws Invalid without an end, or for an unknown part */
export const setAppearance = verb(
  { may: 'draft-note.change' },
  async (context, input: Input): Promise<Appearance> => {
    const { db, workshop } = context;
    const episode = await loadEpisodeOfNotes(context, input);
    if (input.position.endFrame === null)
      throw new Invalid({ position: 'Say until when the part is in view.' });
    await requireKnown(context, episode, { partIds: [input.partId], audience: 'team', askedId: null });
    const anchorId = await makeAnchor(context, episode, input.position);
    await db
      .insert(appearances)
      .values({ id: input.id, workshopId: workshop.id, anchorId, partId: input.partId })
      .onConflictDoNothing();
    await announceNotes(context, episode);
    const [kept] = await db
      .select({ version: appearances.version, anchor: anchors.id })
      .from(appearances)
      .innerJoin(anchors, eq(anchors.id, appearances.anchorId))
      .where(eq(appearances.id, input.id));
    return { id: input.id, version: kept?.version ?? 1, partId: input.partId, position: input.position };
  },
);
