import { and, eq, or } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { barredAskers } from '../../../db/schema/questions.ts';

/** Whether somebody may not ask in a workshop any more, by account or by address. */
export async function isBarred(
  db: Database,
  workshopId: string,
  { accountId, email }: { readonly accountId: string | null; readonly email: string | null },
): Promise<boolean> {
  const ways = [
    ...(accountId === null ? [] : [eq(barredAskers.accountId, accountId)]),
    ...(email === null ? [] : [eq(barredAskers.email, email)]),
  ];
  if (ways.length === 0) return false;
  const [row] = await db
    .select({ id: barredAskers.id })
    .from(barredAskers)
    .where(and(eq(barredAskers.workshopId, workshopId), or(...ways)))
    .limit(1);
  return row !== undefined;
}
