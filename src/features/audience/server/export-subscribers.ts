import { asc, eq } from 'drizzle-orm';
import { subscribers } from '../../../db/schema/audience.ts';
import { builds } from '../../../db/schema/builds.ts';
import { writeCsv } from '../../../domain/csv/write-csv.ts';
import { read } from '../../../server/verb.ts';

/** Every subscriber as a CSV file; instants in UTC. */
export const exportSubscribers = read({ may: 'address.see' }, async ({ db, workshop }) => {
  const rows = await db
    .select({ row: subscribers, build: builds.name })
    .from(subscribers)
    .leftJoin(builds, eq(builds.id, subscribers.buildId))
    .where(eq(subscribers.workshopId, workshop.id))
    .orderBy(asc(subscribers.id));
  const when = (at: Date | null) => at?.toISOString() ?? '';
  return {
    name: `${workshop.slug}-subscribers.csv`,
    // Spreadsheets take a list without this mark for an older encoding.
    text: `\uFEFF${writeCsv([
      ['E-mail', 'State', 'Build', 'Asked', 'Confirmed', 'Left', 'Bounced'],
      ...rows.map(({ row, build }) => [
        row.email,
        row.state,
        build ?? '',
        when(row.askedAt),
        when(row.confirmedAt),
        when(row.leftAt),
        when(row.bouncedAt),
      ]),
    ])}`,
  };
});
