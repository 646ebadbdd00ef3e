import { and, eq } from 'drizzle-orm';
import { messages, subscribers } from '../../../db/schema/audience.ts';
import { NotFound } from '../../../server/errors.ts';
import { isBounceToken } from '../../../server/mail/bounce-token.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../audience.ts';

/**
 * A mail server says that a message came back: its subscriber is mailed no more. A Message-ID that is not ours is
 * passed over.
 * @throws NotFound for a token that BOUNCE_SECRET does not give, or when it is not set
 */
export const reportBounce = verb(
  { may: 'bounce.report' },
  async ({ db, now, services }, input: { readonly token: string; readonly messageId: string }) => {
    const { BOUNCE_SECRET } = services.settings;
    if (BOUNCE_SECRET === undefined || !isBounceToken(BOUNCE_SECRET, input.token)) {
      throw new NotFound();
    }
    const [message] = await db
      .update(messages)
      .set({ state: 'bounced', claimedUntil: null, updatedAt: now })
      .where(eq(messages.messageId, input.messageId))
      .returning({ subscriberId: messages.subscriberId });
    if (message) {
      await db
        .update(subscribers)
        .set({ state: 'bounced', bouncedAt: now })
        .where(and(eq(subscribers.id, message.subscriberId), eq(subscribers.state, 'confirmed')));
    }
    return DONE;
  },
);
