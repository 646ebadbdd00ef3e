import { Forbidden } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type Ask } from '../question.ts';
import { isBarred } from './find-barred.ts';
import { requireNew, writeQuestion } from './write-question.ts';

/**
 * Asks a question as somebody signed in: at a moment, about a part or a note, or about the build.
 * @throws Invalid at `like` while something like it has an answer, and at the field of what is not there;
 * Forbidden for somebody who was barred
 */
export const askQuestion = verb(
  { may: 'question.ask' },
  async (context, input: Ask & { readonly build: string }) => {
    const { db, workshop, actor, now } = context;
    if (actor.kind !== 'account') throw new Error('Only an account can ask.');
    if (await isBarred(db, workshop.id, { accountId: actor.id, email: actor.email })) {
      throw new Forbidden('This workshop takes no more questions from you. Nothing was sent.');
    }
    await requireNew(context, input);
    await writeQuestion(context, input, {
      source: 'account',
      askerId: actor.id,
      askerName: actor.name,
      askerEmail: actor.email,
      confirmedAt: now,
    });
    return { done: true as const };
  },
);
