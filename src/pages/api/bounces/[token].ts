import { BounceInput, bounceParam, Done } from '../../../features/audience/audience.ts';
import { reportBounce } from '../../../features/audience/server/report-bounce.ts';
import { apiRoute } from '../../../server/http/api-route.ts';

/** A mail server reports here what came back. */
export const POST = apiRoute({
  verb: reportBounce,
  params: bounceParam,
  body: BounceInput,
  answer: Done,
  origin: 'any',
});
