import { and, eq, isNull } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { questions } from '../../../db/schema/questions.ts';
import { isSignedToken } from '../../../server/auth/signed-token.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { CONFIRM_DAYS, CONFIRM_PURPOSE } from '../question.ts';
import { isBarred } from './find-barred.ts';

const DAY_MS = 24 * 60 * 60 * 1000;

/**
 * Lets a question wait, once the link that was mailed has been opened. Opened twice, it does no more; for somebody
 * who was barred since, it says the same and does nothing.
 * @throws Invalid for a link that is not ours, or too old
 */
export const confirmQuestion = verb(
  { may: 'mailed-link.follow' },
  async ({ db, now, services }, { question: id, token }: { question: string; token: string }) => {
    const OVER = 'This link is too old, or not whole. Open it from the mail again, or ask anew.';
    if (!isSignedToken(services.settings.AUTH_SECRET, CONFIRM_PURPOSE, id, token)) {
      throw new Invalid({ '': OVER });
    }
    const [row] = await db.select().from(questions).where(eq(questions.id, id)).for('update');
    if (!row) throw new Invalid({ '': OVER });
    if (row.confirmedAt !== null) return { done: true as const };
    if (now.getTime() - row.createdAt.getTime() > CONFIRM_DAYS * DAY_MS) throw new Invalid({ '': OVER });
    const [account] = await db
      .select({ id: accounts.id })
      .from(accounts)
      .where(and(eq(accounts.email, row.askerEmail ?? ''), eq(accounts.emailVerified, true)));
    const askerId = account?.id ?? null;
    if (await isBarred(db, row.workshopId, { accountId: askerId, email: row.askerEmail })) {
      return { done: true as const };
    }
    await db
      .update(questions)
      .set({ confirmedAt: now, askerId, updatedAt: now })
      .where(and(eq(questions.id, id), isNull(questions.confirmedAt)));
    return { done: true as const };
  },
);
