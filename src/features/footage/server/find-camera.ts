import { and, eq, isNull, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { cameras } from '../../../db/schema/footage.ts';

/** The workshop's camera of a name, however its letters are cased; null when there is none. */
export async function findCamera(
  db: Database,
  workshopId: string,
  name: string,
): Promise<{ readonly id: string; readonly name: string } | null> {
  const [found] = await db
    .select({ id: cameras.id, name: cameras.name })
    .from(cameras)
    .where(
      and(
        eq(cameras.workshopId, workshopId),
        eq(sql`lower(${cameras.name})`, sql`lower(${name})`),
        isNull(cameras.deletedAt),
      ),
    );
  return found ?? null;
}
