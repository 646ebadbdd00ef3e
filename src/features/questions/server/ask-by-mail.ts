import { verb } from '../../../server/verb.ts';
import { type AskByMail } from '../question.ts';
import { requireNew, writeQuestion } from './write-question.ts';

/**
 * Takes a question from somebody who gives an address: it waits only once the link that is sent there has been
 * opened. The answer is the same whether the address is known, unknown or barred.
 * @throws Invalid at `like` while something like it has an answer, and at the field of what is not there
 */
export const askByMail = verb(
  { may: 'question.ask-by-mail' },
  async (context, input: AskByMail & { readonly build: string }) => {
    const { db, services } = context;
    await requireNew(context, input);
    const questionId = await writeQuestion(context, input, {
      source: 'mail',
      askerName: input.name,
      askerEmail: input.email,
    });
    await services.jobs.enqueue(db, 'question-sent', { questionId });
    return { done: true as const };
  },
);
