import { count, eq } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { messages } from '../../../db/schema/audience.ts';
import {
  type AnnouncementState,
  MESSAGE_STATES,
  type MessageState,
} from '../../../domain/audience/audience-states.ts';
import { type AnnouncementProgress } from '../audience.ts';

/** How far an announcement has come: its messages by state. */
export async function countMessages(
  db: Database,
  announcement: { readonly id: string; readonly state: AnnouncementState },
): Promise<AnnouncementProgress> {
  const rows = await db
    .select({ state: messages.state, count: count() })
    .from(messages)
    .where(eq(messages.announcementId, announcement.id))
    .groupBy(messages.state);
  const counts = Object.fromEntries(MESSAGE_STATES.map((state) => [state, 0])) as Record<
    MessageState,
    number
  >;
  for (const row of rows) counts[row.state] = row.count;
  return { state: announcement.state, counts, total: rows.reduce((sum, row) => sum + row.count, 0) };
}
