import { paths } from '../../../paths.ts';
import { read } from '../../../server/verb.ts';
import { CONFIRM_PURPOSE, LEAVE_PURPOSE } from '../audience.ts';
import { loadSubscription } from './load-subscription.ts';

/** A subscription as its mailed link shows it. @throws NotFound when the link is not one of ours */
export const getSubscription = read(
  { may: 'mailed-link.follow' },
  async (
    context,
    input: { readonly subscriber: string; readonly token: string; readonly to: 'confirm' | 'leave' },
  ) => {
    const purpose = input.to === 'confirm' ? CONFIRM_PURPOSE : LEAVE_PURPOSE;
    const { email, state, workshop, build } = await loadSubscription(
      context,
      purpose,
      input.subscriber,
      input.token,
    );
    return { email, state, workshop, build, leavePage: paths.leave(input.subscriber, input.token) };
  },
);
