import { and, desc, eq, isNotNull, isNull, or, type SQL } from 'drizzle-orm';
import { answers, questions } from '../../../db/schema/questions.ts';
import { read } from '../../../server/verb.ts';
import { type QuestionList } from '../question.ts';
import { loadQuestions } from './load-questions.ts';
import { presentForTeam } from './present-question.ts';

const IN_LIST: Readonly<Record<QuestionList, SQL | undefined>> = {
  waiting: and(eq(questions.state, 'waiting'), isNull(questions.mergedInto)),
  unanswered: and(eq(questions.state, 'shown'), isNull(questions.mergedInto), isNull(answers.answeredAt)),
  answered: and(
    eq(questions.state, 'shown'),
    or(isNotNull(answers.answeredAt), isNotNull(questions.mergedInto)),
  ),
  hidden: eq(questions.state, 'hidden'),
};

/** The questions of a workshop in one of its lists: urgent ones first, then risky ones, then as they came. */
export const listQuestions = read(
  { may: 'question.sort' },
  async (context, { list }: { readonly list: QuestionList }) => {
    const { db, workshop } = context;
    const rows = await loadQuestions(db, and(eq(questions.workshopId, workshop.id), IN_LIST[list]), [
      desc(isNotNull(questions.urgentAt)),
      desc(questions.risky),
    ]);
    return { items: rows.map((row) => presentForTeam(context, row)), nextCursor: null };
  },
);
