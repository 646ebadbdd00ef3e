import { and, asc, eq, isNotNull, isNull, or } from 'drizzle-orm';
import { builds } from '../../../db/schema/builds.ts';
import { answers, questions } from '../../../db/schema/questions.ts';
import { may } from '../../../domain/permissions.ts';
import { type Waiting } from '../../../domain/waiting.ts';
import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';

/** So much of a question stands in Today. */
const WORDS = 90;

/** What of the questions waits for whoever asks: what only the owner answers, what is theirs, what wants sorting. */
export const listWaitingQuestions = read(
  { may: 'workshop.see-bench' },
  async ({ db, workshop, role, actor }): Promise<readonly Waiting[]> => {
    const rows = await db
      .select({ question: questions, answer: answers })
      .from(questions)
      .innerJoin(builds, and(eq(builds.id, questions.buildId), isNull(builds.deletedAt)))
      .leftJoin(answers, eq(answers.questionId, questions.id))
      .where(
        and(
          eq(questions.workshopId, workshop.id),
          isNotNull(questions.confirmedAt),
          isNull(questions.mergedInto),
          isNull(answers.answeredAt),
          or(eq(questions.state, 'waiting'), eq(questions.state, 'shown')),
        ),
      )
      .orderBy(asc(questions.createdAt));
    const owner = may(role, 'question.answer-risky');
    const mine = actor.kind === 'account' ? actor.id : null;
    const waiting: Waiting[] = [];
    const add = (urgency: Waiting['urgency'], what: string, href: string) =>
      waiting.push({ urgency, what, href, due: null });
    for (const { question, answer } of rows) {
      const said = `“${shorten(question.text)}”`;
      const href = paths.benchQuestion(workshop.slug, question.id);
      if (question.urgentAt !== null) add(owner ? 'now' : 'soon', `Urgent question: ${said}`, href);
      else if (owner && question.risky && answer !== null)
        add('soon', `A drafted answer waits for you: ${said}`, href);
      else if (owner && question.risky) add('soon', `Risky, for you to answer: ${said}`, href);
      else if (question.assignedTo !== null && question.assignedTo === mine)
        add('soon', `Yours to answer: ${said}`, href);
    }
    const unsorted = rows.filter(({ question }) => question.state === 'waiting').length;
    if (unsorted > 0) add('soon', sayUnsorted(unsorted), paths.questions(workshop.slug));
    const open = rows.filter(({ question }) => question.state === 'shown' && !question.risky).length;
    if (open > 0) add('whenever', sayOpen(open), paths.questions(workshop.slug, 'unanswered'));
    return waiting;
  },
);

function shorten(text: string): string {
  const line = text.replace(/\s+/g, ' ');
  return line.length <= WORDS ? line : `${line.slice(0, WORDS).replace(/ \S*$/, '')} …`;
}

function sayUnsorted(count: number): string {
  return count === 1
    ? 'One question waits to be shown or hidden.'
    : `${String(count)} questions wait to be shown or hidden.`;
}

function sayOpen(count: number): string {
  return count === 1
    ? 'One shown question has no answer yet.'
    : `${String(count)} shown questions have no answer yet.`;
}
