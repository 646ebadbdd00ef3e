import { and, eq } from 'drizzle-orm';
import { memberships } from '../../../db/schema/workshops.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { changeQuestion } from './change-question.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/** Gives a question to somebody of the team, or to nobody. @throws Invalid at `to` for anyone else, Conflict */
export const assignQuestion = verb(
  { may: 'question.sort' },
  async (context, input: QuestionRef & { readonly to: string | null; readonly version: number }) => {
    const { db, workshop } = context;
    const { question } = await lockQuestion(context, input);
    if (input.to !== null) {
      const [member] = await db
        .select({ id: memberships.id })
        .from(memberships)
        .where(and(eq(memberships.workshopId, workshop.id), eq(memberships.accountId, input.to)));
      if (!member) throw new Invalid({ to: 'That person is not on the team any more. Choose another.' });
    }
    return changeQuestion(context, question, { assignedTo: input.to });
  },
);
