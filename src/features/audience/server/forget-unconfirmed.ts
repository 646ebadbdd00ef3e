import { and, eq, lt } from 'drizzle-orm';
import { subscribers } from '../../../db/schema/audience.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { CONFIRM_DAYS } from '../audience.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/** Erases addresses whose link is over and was never followed: nobody has said that they are theirs. */
export const forgetUnconfirmed: JobHandler = async ({ db }) => {
  const over = new Date(Date.now() - CONFIRM_DAYS * DAY_MS);
  await db.delete(subscribers).where(and(eq(subscribers.state, 'asked'), lt(subscribers.askedAt, over)));
};
