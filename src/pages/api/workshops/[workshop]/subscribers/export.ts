import { z } from 'zod';
import { exportSubscribers } from '../../../../../features/audience/server/export-subscribers.ts';
import { workshopParam } from '../../../../../features/workshops/workshop.ts';
import { apiRoute, NONE } from '../../../../../server/http/api-route.ts';

export const GET = apiRoute({
  verb: exportSubscribers,
  params: workshopParam,
  body: NONE,
  answer: z.object({ name: z.string(), text: z.string() }),
  reply: ({ name, text }) =>
    new Response(text, {
      headers: {
        'content-type': 'text/csv; charset=utf-8',
        // Made of an address name, so that it needs no quoting.
        'content-disposition': `attachment; filename="${name}"`,
        'cache-control': 'private, no-store',
        'x-content-type-options': 'nosniff',
      },
    }),
});
