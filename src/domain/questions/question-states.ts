/** What became of a question: it waits to be looked at, or was shown to everyone, or hidden. */
export const QUESTION_STATES = ['waiting', 'shown', 'hidden'] as const;
export type QuestionState = (typeof QUESTION_STATES)[number];

/** Where a question came from: someone signed in, someone by mail, or a comment found elsewhere. */
export const QUESTION_SOURCES = ['account', 'mail', 'pasted'] as const;
export type QuestionSource = (typeof QUESTION_SOURCES)[number];

/** How far its answer is. */
export const ANSWER_STATES = ['unanswered', 'drafted', 'answered'] as const;
export type AnswerState = (typeof ANSWER_STATES)[number];

/** How far an answer is. @param answer null while nobody has written any */
export function answerState(answer: { readonly answeredAt: Date | null } | null): AnswerState {
  if (answer === null) return 'unanswered';
  return answer.answeredAt === null ? 'drafted' : 'answered';
}
