import { CONFIRM_PURPOSE, LEAVE_PURPOSE } from '../features/audience/audience.ts';
import { confirmSubscription } from '../features/audience/server/confirm-subscription.ts';
import { leave } from '../features/audience/server/leave.ts';
import { listSubscribers } from '../features/audience/server/list-subscribers.ts';
import { subscribe } from '../features/audience/server/subscribe.ts';
import { signToken } from '../server/auth/signed-token.ts';
import { type Context } from '../server/context.ts';

const BUILD = 'orchard-press';

/** Who wants to hear of the press, or of everything, and how far each has come. */
const SUBSCRIBERS: readonly (readonly [
  email: string,
  of: 'press' | 'all',
  then: 'asks' | 'confirms' | 'leaves',
])[] = [
  ['sam@example.com', 'press', 'confirms'],
  ['ana@example.com', 'all', 'confirms'],
  ['ines.tolland@example.com', 'press', 'confirms'],
  ['per.lindgard@example.com', 'press', 'confirms'],
  ['rowan.quill@example.com', 'all', 'confirms'],
  ['maud.orrin@example.com', 'press', 'confirms'],
  ['dov.farrow@example.com', 'press', 'asks'],
  ['kit.sorrel@example.com', 'press', 'leaves'],
];

/**
 * Puts the demo's subscribers on the list as people do: each asks, follows the mailed link, and may leave.
 * @param anyone somebody who is not signed in, at the workshop
 */
export async function seedSubscribers(owner: Context, anyone: Context): Promise<void> {
  const { AUTH_SECRET } = owner.services.settings;
  await Promise.all(
    SUBSCRIBERS.map(([email, of]) => subscribe(anyone, { email, ...(of === 'press' && { build: BUILD }) })),
  );
  const { items } = await listSubscribers(owner, {});
  for (const { id: subscriber, email } of items) {
    const then = SUBSCRIBERS.find(([address]) => address === email)?.[2];
    const token = (purpose: string) => signToken(AUTH_SECRET, purpose, subscriber);
    if (then !== 'asks') await confirmSubscription(anyone, { subscriber, token: token(CONFIRM_PURPOSE) });
    if (then === 'leaves') await leave(anyone, { subscriber, token: token(LEAVE_PURPOSE) });
  }
}
