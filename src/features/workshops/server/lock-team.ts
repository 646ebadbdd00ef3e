import { eq } from 'drizzle-orm';
import { memberships, workshops } from '../../../db/schema/workshops.ts';
import { type Database } from '../../../db/client.ts';

/** Reads a team with the workshop locked, so that two changes at once cannot leave it without an owner. */
export async function lockTeam(db: Database, workshopId: string) {
  await db.select({ id: workshops.id }).from(workshops).where(eq(workshops.id, workshopId)).for('update');
  return db
    .select({ id: memberships.id, accountId: memberships.accountId, role: memberships.role })
    .from(memberships)
    .where(eq(memberships.workshopId, workshopId));
}
