import { and, desc, eq, isNotNull, isNull, or, sql } from 'drizzle-orm';
import { answers, questions } from '../../../db/schema/questions.ts';
import { type Database } from '../../../db/client.ts';

/** How alike two questions are before one is offered for the other, 0 to 1. Our own choice, by trying it out. */
const LIKE = { whole: 0.3, within: 0.55 };
const MOST_LIKE = 3;

/** The shown and answered questions of a build that ask something like a text, the most alike first. */
export async function findLike(
  db: Database,
  buildId: string,
  text: string,
): Promise<{ readonly id: string; readonly text: string }[]> {
  const whole = sql<number>`similarity(${questions.text}, ${text})`;
  const within = sql<number>`word_similarity(${text}, ${questions.text})`;
  return db
    .select({ id: questions.id, text: questions.text })
    .from(questions)
    .innerJoin(answers, and(eq(answers.questionId, questions.id), isNotNull(answers.answeredAt)))
    .where(
      and(
        eq(questions.buildId, buildId),
        eq(questions.state, 'shown'),
        isNull(questions.mergedInto),
        or(sql`${whole} >= ${LIKE.whole}`, sql`${within} >= ${LIKE.within}`),
      ),
    )
    .orderBy(desc(sql`greatest(${whole}, ${within})`))
    .limit(MOST_LIKE);
}
