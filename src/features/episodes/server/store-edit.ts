import { eq, max } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { editClips, edits, episodes } from '../../../db/schema/episodes.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { toEditRecord } from '../../../domain/edit/edit-record.ts';
import { type EditSource } from '../../../domain/edit/edit-sources.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { placeTakenEdit } from './place-taken-edit.ts';

/** How many rows one statement takes: PostgreSQL counts parameters in 16 bits. */
const ROWS_AT_ONCE = 5000;

interface NewEdit {
  readonly source: EditSource;
  readonly sourceName: string;
  readonly sourceText: string | null;
  readonly edit: Edit;
  /** By the edit's names; null for none of the footage. */
  readonly clipIds: ReadonlyMap<string, string | null>;
}

/**
 * Locks an episode against another edit of it, until the transaction ends.
 * @returns the number of its newest edit; 0 before the first
 */
export async function lockEdits({ db }: WorkshopContext, episodeId: string): Promise<number> {
  await db.select({ id: episodes.id }).from(episodes).where(eq(episodes.id, episodeId)).for('update');
  const [last] = await db
    .select({ number: max(edits.number) })
    .from(edits)
    .where(eq(edits.episodeId, episodeId));
  return last?.number ?? 0;
}

/** Keeps an edit as the next version of its episode, which the caller has locked, and gives everything its place in it. */
export async function storeEdit(
  { db, workshop, actor }: WorkshopContext,
  episodeId: string,
  number: number,
  { source, sourceName, sourceText, edit, clipIds }: NewEdit,
): Promise<{ readonly id: string; readonly number: number }> {
  const id = newId();
  await db.insert(edits).values({
    id,
    workshopId: workshop.id,
    episodeId,
    number,
    source,
    sourceName,
    sourceText,
    rateNum: edit.rate.num,
    rateDen: edit.rate.den,
    frames: Number(edit.frames.ceil()),
    record: toEditRecord(edit),
    takenBy: actor.kind === 'account' ? actor.id : null,
  });
  const rows = [...clipIds].map(([name, clipId]) => ({ workshopId: workshop.id, editId: id, name, clipId }));
  for (let from = 0; from < rows.length; from += ROWS_AT_ONCE)
    await db.insert(editClips).values(rows.slice(from, from + ROWS_AT_ONCE));
  await placeTakenEdit(db, id);
  return { id, number };
}
