import { eq } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { parts } from '../../../db/schema/parts.ts';

/** The numbers of a build's parts by their ids, of deleted ones too. */
export async function loadPartNumbers(db: Database, buildId: string): Promise<ReadonlyMap<string, string>> {
  const rows = await db
    .select({ id: parts.id, number: parts.number })
    .from(parts)
    .where(eq(parts.buildId, buildId));
  return new Map(rows.map(({ id, number }) => [id, number]));
}
