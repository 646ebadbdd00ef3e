import { and, inArray, isNull, lt } from 'drizzle-orm';
import { anchors } from '../../../db/schema/notes.ts';
import { questions } from '../../../db/schema/questions.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { CONFIRM_DAYS } from '../question.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/** Erases questions whose link nobody opened in time: what they hold is somebody's address, and nobody's question. */
export const eraseUnconfirmed: JobHandler = async ({ db }) => {
  const before = new Date(Date.now() - CONFIRM_DAYS * DAY_MS);
  const gone = await db
    .delete(questions)
    .where(and(isNull(questions.confirmedAt), lt(questions.createdAt, before)))
    .returning({ anchorId: questions.anchorId });
  const moments = gone.flatMap(({ anchorId }) => anchorId ?? []);
  if (moments.length > 0) await db.delete(anchors).where(inArray(anchors.id, moments));
};
