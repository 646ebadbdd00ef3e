import { and, eq, isNull } from 'drizzle-orm';
import { episodes } from '../../../db/schema/episodes.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { may } from '../../../domain/permissions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Forbidden, Invalid } from '../../../server/errors.ts';

/** @throws Invalid for a note that is not of the build, Forbidden for one that only the owner changes */
export async function requireMayCarry(
  { db, workshop, role }: WorkshopContext,
  buildId: string,
  noteId: string,
): Promise<void> {
  const [found] = await db
    .select({ state: episodes.state })
    .from(notes)
    .innerJoin(anchors, eq(anchors.id, notes.anchorId))
    .leftJoin(episodes, eq(episodes.id, anchors.episodeId))
    .where(
      and(
        eq(notes.id, noteId),
        eq(notes.workshopId, workshop.id),
        eq(notes.buildId, buildId),
        isNull(notes.deletedAt),
      ),
    );
  if (!found) throw new Invalid({ note: 'That note is not here any more. Choose another.' });
  if (found.state === 'published' && !may(role, 'published-number.change'))
    throw new Forbidden(
      'The episode is published, and builders work from its numbers: only the owner gives its notes a result.',
    );
}
