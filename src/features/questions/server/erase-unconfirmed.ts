import { and, isNull, lt } from 'drizzle-orm';
import { questions } from '../../../db/schema/questions.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { CONFIRM_DAYS } from '../question.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/** Erases questions whose link nobody opened in time: what they hold is somebody's address, and nobody's question. */
export const eraseUnconfirmed: JobHandler = async ({ db }) => {
  const before = new Date(Date.now() - CONFIRM_DAYS * DAY_MS);
  await db.delete(questions).where(and(isNull(questions.confirmedAt), lt(questions.createdAt, before)));
};
