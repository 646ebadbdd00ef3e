import { and, eq, isNull } from 'drizzle-orm';
import { editions } from '../../../db/schema/episodes.ts';
import { places } from '../../../db/schema/places.ts';
import { GUARDED_KINDS, type NoteKind } from '../../../domain/note-kinds.ts';
import { may } from '../../../domain/permissions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Forbidden } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { type EpisodeOfNotes } from './load-episode.ts';

/** Whether a note of this kind, by this person, only proposes: numbers of a published episode are the owner's. */
export function isProposal({ role }: WorkshopContext, episode: EpisodeOfNotes, kind: NoteKind): boolean {
  return (
    episode.state === 'published' && GUARDED_KINDS.includes(kind) && !may(role, 'published-number.change')
  );
}

/** @throws Forbidden where a person may only propose */
export function requireMayChange(
  context: WorkshopContext,
  episode: EpisodeOfNotes,
  kinds: readonly NoteKind[],
): void {
  if (kinds.some((kind) => isProposal(context, episode, kind))) {
    throw new Forbidden(
      'The episode is published, and builders work from this number: only the owner changes it. Your text is kept here; add it as a note of its own to propose it.',
    );
  }
}

/**
 * Tells the public pages that show something of an episode's desk that it has changed.
 * @param anchorId of what others episodes may show too; left out where placing it has told them
 */
export async function announceNotes(
  { db }: WorkshopContext,
  episode: EpisodeOfNotes,
  anchorId?: string,
): Promise<void> {
  const showing =
    anchorId === undefined
      ? []
      : await db
          .selectDistinct({ id: editions.episodeId })
          .from(places)
          .innerJoin(editions, eq(editions.editId, places.editId))
          .where(
            and(eq(places.anchorId, anchorId), isNull(editions.replacedAt), isNull(editions.withdrawnAt)),
          );
  const own = episode.state === 'published' ? [episode.id] : [];
  const ids = new Set([...own, ...showing.map(({ id }) => id)]);
  if (ids.size > 0)
    await announcePageChanges(
      db,
      [...ids].map((id) => `episode:${id}`),
    );
}
