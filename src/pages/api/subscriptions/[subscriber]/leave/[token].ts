import { z } from 'zod';
import { Done, leaveParams } from '../../../../../features/audience/audience.ts';
import { getSubscription } from '../../../../../features/audience/server/get-subscription.ts';
import { leave } from '../../../../../features/audience/server/leave.ts';
import { paths } from '../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../server/http/api-route.ts';

/** A mailbox posts here by itself (RFC 8058), from wherever it is and without cookies; our own page does, too. */
export const POST = apiRoute({
  verb: leave,
  params: leaveParams,
  body: NONE,
  answer: Done,
  origin: 'any',
  form: {
    page: ({ subscriber, token }) => paths.leave(subscriber, token),
    // No redirect: RFC 8058 (3.1) says that a mailbox may not follow one.
    done: () => null,
  },
});

/** Someone who opens the address of the header gets the page, which leaves when its button is pressed. */
export const GET = apiRoute({
  verb: getSubscription,
  params: leaveParams.extend({ to: z.literal('leave').default('leave') }),
  body: NONE,
  answer: NONE,
  reply: ({ leavePage }) => new Response(null, { status: 303, headers: { location: leavePage } }),
});
