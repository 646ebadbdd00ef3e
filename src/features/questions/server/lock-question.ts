import { and, eq, isNotNull, isNull } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { answers, questions } from '../../../db/schema/questions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';

export interface QuestionRef {
  readonly question: string;
}

/**
 * A question of the workshop with its answer, locked for the change that follows, so that nobody marks it risky
 * while it is being answered.
 * @param ref.version when the change names the one it saw
 * @throws NotFound, Conflict with the stored version
 */
export async function lockQuestion(
  { db, workshop }: WorkshopContext,
  ref: QuestionRef & { readonly version?: number },
) {
  const [row] = await db
    .select({ question: questions })
    .from(questions)
    .innerJoin(builds, and(eq(builds.id, questions.buildId), isNull(builds.deletedAt)))
    .where(
      and(
        eq(questions.id, ref.question),
        eq(questions.workshopId, workshop.id),
        isNotNull(questions.confirmedAt),
      ),
    )
    .for('update', { of: questions });
  if (!row) throw new NotFound('This question');
  const { question } = row;
  const { id, version, state } = question;
  if (ref.version !== undefined && ref.version !== version) {
    throw new Conflict(
      { id, version, state },
      'Someone else sorted this question in the meantime. Look at what it says now, then choose again.',
    );
  }
  const [answer = null] = await db.select().from(answers).where(eq(answers.questionId, id));
  return { question, answer };
}
