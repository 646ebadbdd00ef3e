import { and, count, eq, inArray, isNull } from 'drizzle-orm';
import { noteParts } from '../../../db/schema/notes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { memberships } from '../../../db/schema/workshops.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { type NoteFields } from '../note.ts';
import { type EpisodeOfNotes } from './load-episode.ts';

/** @throws Invalid when a part is not of this build, or the person asked is not of the team */
export async function requireKnown(
  { db, workshop }: WorkshopContext,
  episode: EpisodeOfNotes,
  { partIds, audience, askedId }: Pick<NoteFields, 'partIds' | 'audience' | 'askedId'>,
): Promise<void> {
  const unique = [...new Set(partIds)];
  if (unique.length > 0) {
    const [found] = await db
      .select({ known: count() })
      .from(parts)
      .where(and(inArray(parts.id, unique), eq(parts.buildId, episode.buildId), isNull(parts.deletedAt)));
    if (found?.known !== unique.length) {
      throw new Invalid({ partIds: 'One of these parts is not in the parts list any more. Choose another.' });
    }
  }
  if (audience !== 'person' || askedId === null) return;
  const [member] = await db
    .select({ id: memberships.id })
    .from(memberships)
    .where(and(eq(memberships.workshopId, workshop.id), eq(memberships.accountId, askedId)));
  if (!member) throw new Invalid({ askedId: 'That person is not on the team any more. Choose another.' });
}

/** Replaces the parts that a note names, in their order. */
export async function writeParts(
  { db, workshop }: WorkshopContext,
  noteId: string,
  partIds: readonly string[],
): Promise<void> {
  await db.delete(noteParts).where(eq(noteParts.noteId, noteId));
  const unique = [...new Set(partIds)];
  if (unique.length === 0) return;
  await db
    .insert(noteParts)
    .values(unique.map((partId, position) => ({ workshopId: workshop.id, noteId, partId, position })));
}
