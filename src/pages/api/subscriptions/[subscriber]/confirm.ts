import { ConfirmInput, Done, subscriberParam } from '../../../../features/audience/audience.ts';
import { confirmSubscription } from '../../../../features/audience/server/confirm-subscription.ts';
import { paths } from '../../../../paths.ts';
import { apiRoute } from '../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: confirmSubscription,
  params: subscriberParam,
  body: ConfirmInput,
  answer: Done,
  limit: [{ name: 'confirm-subscription', by: 'address', tries: 60, seconds: 3600 }],
  form: {
    page: ({ subscriber }, values) => paths.confirmSubscription(subscriber, values['token'] ?? ''),
    done: (_result, { subscriber, token }) => paths.confirmSubscription(subscriber, token),
  },
});
