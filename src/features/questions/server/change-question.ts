import { eq, sql } from 'drizzle-orm';
import { answers, answerVersions, questions } from '../../../db/schema/questions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';

type Question = typeof questions.$inferSelect;
type Answer = typeof answers.$inferSelect;

/** Writes columns of a locked question, counts its version up and tells the pages that show it. */
export async function changeQuestion(
  { db, now }: WorkshopContext,
  question: Pick<Question, 'id' | 'buildId'>,
  columns: Partial<typeof questions.$inferInsert>,
): Promise<{ id: string; version: number }> {
  const [saved] = await db
    .update(questions)
    .set({ ...columns, version: sql`${questions.version} + 1`, updatedAt: now })
    .where(eq(questions.id, question.id))
    .returning({ id: questions.id, version: questions.version });
  if (!saved) throw new Error('A locked question is gone.');
  await announcePageChanges(db, [`build:${question.buildId}`]);
  return saved;
}

/** Keeps what an answer said before a change to it. */
export async function keepAnswer(
  { db, workshop, actor, now }: WorkshopContext,
  answer: Answer,
): Promise<void> {
  await db.insert(answerVersions).values({
    workshopId: workshop.id,
    answerId: answer.id,
    version: answer.version,
    fields: { text: answer.text, answeredAt: answer.answeredAt, byOwner: answer.byOwner },
    changedBy: actor.kind === 'account' ? actor.id : null,
    changedAt: now,
  });
}

/**
 * Marks a locked question risky. An answer to it that the owner did not send becomes a draft again, and whoever
 * asked is told anew once the owner has answered. One that repeats another stands by itself again: that the other's
 * answer holds for it, too, is for the owner to say.
 */
export async function makeRisky(
  context: WorkshopContext,
  question: Question,
  answer: Answer | null,
  columns: Partial<typeof questions.$inferInsert> = {},
): Promise<{ id: string; version: number }> {
  const { db, now } = context;
  const falls = answer !== null && answer.answeredAt !== null && !answer.byOwner;
  if (falls) {
    await keepAnswer(context, answer);
    await db
      .update(answers)
      .set({ answeredAt: null, version: answer.version + 1, updatedAt: now })
      .where(eq(answers.id, answer.id));
    await db.update(questions).set({ toldAt: null }).where(eq(questions.mergedInto, question.id));
  }
  const anew = falls || question.mergedInto !== null;
  return changeQuestion(context, question, {
    ...columns,
    risky: true,
    ...(anew && { mergedInto: null, toldAt: null }),
  });
}
