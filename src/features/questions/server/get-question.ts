import { and, desc, eq } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { answers, answerVersions, questions } from '../../../db/schema/questions.ts';
import { type Database } from '../../../db/client.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { isBarred } from './find-barred.ts';
import { loadQuestions } from './load-questions.ts';
import { presentForTeam } from './present-question.ts';

/** A question as its team sees it, with what its answer said before. @throws NotFound */
export const getQuestion = read(
  { may: 'question.sort' },
  async (context, { question: id }: { readonly question: string }) => {
    const { db, workshop } = context;
    const [row] = await loadQuestions(db, and(eq(questions.id, id), eq(questions.workshopId, workshop.id)));
    if (!row) throw new NotFound('This question');
    const { askerId, askerEmail } = row.question;
    return {
      ...presentForTeam(context, row),
      barred: await isBarred(db, workshop.id, { accountId: askerId, email: askerEmail }),
      canBeBarred: askerId !== null || askerEmail !== null,
      earlier: await loadEarlier(db, id),
    };
  },
);

async function loadEarlier(db: Database, questionId: string) {
  const rows = await db
    .select({ fields: answerVersions.fields, by: accounts.name, at: answerVersions.changedAt })
    .from(answerVersions)
    .innerJoin(answers, eq(answers.id, answerVersions.answerId))
    .leftJoin(accounts, eq(accounts.id, answerVersions.changedBy))
    .where(eq(answers.questionId, questionId))
    .orderBy(desc(answerVersions.version));
  return rows.map(({ fields, by, at }) => ({ text: (fields as { text: string }).text, by, at }));
}
