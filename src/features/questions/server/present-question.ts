import { answerState } from '../../../domain/questions/question-states.ts';
import { may } from '../../../domain/permissions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { renderMarkdown } from '../../../server/render-markdown.ts';
import { type BenchQuestion, type PublicQuestion } from '../question.ts';
import { type QuestionRow } from './load-questions.ts';

function presentCore({ question, build, moment, note, parts }: QuestionRow) {
  const { id, text, askerName, createdAt: askedAt, risky, risks } = question;
  return { id, build, text, askerName, askedAt, moment, note, parts, risky, risks };
}

/** A question as everyone sees it; a draft is nobody's to see. */
export function presentPublic(row: QuestionRow): PublicQuestion {
  const { answer, writer } = row;
  return {
    ...presentCore(row),
    answer:
      answer?.answeredAt == null
        ? null
        : { html: renderMarkdown(answer.text), by: writer, answeredAt: answer.answeredAt },
  };
}

/** A question as its team sees it; the asker's address for those who may see addresses. */
export function presentForTeam({ role }: Pick<WorkshopContext, 'role'>, row: QuestionRow): BenchQuestion {
  const { question, answer, writer, assignee, original } = row;
  return {
    ...presentCore(row),
    state: question.state,
    source: question.source,
    foundAt: question.foundAt,
    askerEmail: may(role, 'address.see') ? question.askerEmail : null,
    urgentAt: question.urgentAt,
    assigned: question.assignedTo === null ? null : { id: question.assignedTo, name: assignee ?? '' },
    mergedInto: original,
    version: question.version,
    answerState: answerState(answer),
    answer: answer && {
      text: answer.text,
      html: renderMarkdown(answer.text),
      by: writer,
      answeredAt: answer.answeredAt,
      byOwner: answer.byOwner,
      version: answer.version,
    },
  };
}
