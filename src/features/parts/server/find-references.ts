import { count, inArray } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { clipParts } from '../../../db/schema/footage.ts';
import { appearances, noteParts } from '../../../db/schema/notes.ts';
import { questionParts } from '../../../db/schema/questions.ts';

/**
 * How often notes, appearances, questions and clips refer to parts, those that were deleted and can come back included.
 * @returns by part; a part that nothing refers to is not in it
 */
export async function findReferences(db: Database, ids: readonly string[]): Promise<Map<string, number>> {
  const found = new Map<string, number>();
  if (ids.length === 0) return found;
  // One after another: inside a transaction they share a connection.
  for (const table of [noteParts, appearances, questionParts, clipParts]) {
    const rows = await db
      .select({ partId: table.partId, times: count() })
      .from(table)
      .where(inArray(table.partId, [...ids]))
      .groupBy(table.partId);
    for (const { partId, times } of rows) found.set(partId, (found.get(partId) ?? 0) + times);
  }
  return found;
}
