import { Done, SubscribeInput } from '../../../../../../features/audience/audience.ts';
import { subscribe } from '../../../../../../features/audience/server/subscribe.ts';
import { buildParams } from '../../../../../../features/builds/build.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: subscribe,
  params: buildParams,
  body: SubscribeInput,
  answer: Done,
  limit: [
    { name: 'subscribe', by: 'address', tries: 20, seconds: 3600 },
    { name: 'subscribe', by: 'email', tries: 5, seconds: 3600 },
  ],
  form: {
    page: ({ workshop, build }) => paths.subscribe(workshop, build),
    done: () => paths.askedToSubscribe(),
  },
});
