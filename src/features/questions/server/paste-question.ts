import { verb } from '../../../server/verb.ts';
import { type Paste } from '../question.ts';
import { writeQuestion } from './write-question.ts';

/**
 * Brings in a comment that was found elsewhere, with the name and the address it had there. It is sorted like any
 * other question; nobody is mailed about it.
 */
export const pasteQuestion = verb(
  { may: 'question.sort' },
  async (context, input: Paste & { readonly build: string }) => {
    const id = await writeQuestion(context, input, {
      source: 'pasted',
      askerName: input.name,
      foundAt: input.foundAt,
      confirmedAt: context.now,
    });
    return { id, version: 1 };
  },
);
