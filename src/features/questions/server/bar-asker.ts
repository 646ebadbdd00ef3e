import { and, eq, or } from 'drizzle-orm';
import { memberships } from '../../../db/schema/workshops.ts';
import { barredAskers } from '../../../db/schema/questions.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { lockQuestion, type QuestionRef } from './lock-question.ts';

/**
 * Bars whoever asked a question from asking again in this workshop, or lets them ask again. What they asked before
 * stays as it was sorted.
 * @throws Invalid for a comment that was pasted in, and for somebody of the team
 */
export const barAsker = verb(
  { may: 'question.sort' },
  async (context, input: QuestionRef & { readonly barred: boolean }) => {
    const { db, workshop, actor } = context;
    const { question } = await lockQuestion(context, { question: input.question });
    const { id, version, askerId, askerEmail } = question;
    if (askerId === null && askerEmail === null)
      throw new Invalid({ '': 'This was pasted in from elsewhere; there is nobody here to bar.' });
    if (askerId !== null && (await isOfTeam(context, askerId)))
      throw new Invalid({ '': 'They are on the team, and cannot be barred.' });
    if (input.barred) {
      const ways = [
        ...(askerId === null ? [] : [{ accountId: askerId }]),
        ...(askerEmail === null ? [] : [{ email: askerEmail }]),
      ];
      const barredBy = actor.kind === 'account' ? actor.id : null;
      await db
        .insert(barredAskers)
        .values(ways.map((way) => ({ workshopId: workshop.id, barredBy, ...way })))
        .onConflictDoNothing();
    } else {
      await db
        .delete(barredAskers)
        .where(
          and(
            eq(barredAskers.workshopId, workshop.id),
            or(
              ...(askerId === null ? [] : [eq(barredAskers.accountId, askerId)]),
              ...(askerEmail === null ? [] : [eq(barredAskers.email, askerEmail)]),
            ),
          ),
        );
    }
    return { id, version };
  },
);

async function isOfTeam({ db, workshop }: WorkshopContext, accountId: string): Promise<boolean> {
  const [member] = await db
    .select({ id: memberships.id })
    .from(memberships)
    .where(and(eq(memberships.workshopId, workshop.id), eq(memberships.accountId, accountId)));
  return member !== undefined;
}
