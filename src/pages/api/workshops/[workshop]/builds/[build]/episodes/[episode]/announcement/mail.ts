import { z } from 'zod';
import { episodeParams } from '../../../../../../../../../features/audience/audience.ts';
import { getAnnouncement } from '../../../../../../../../../features/audience/server/get-announcement.ts';
import { apiRoute, NONE } from '../../../../../../../../../server/http/api-route.ts';

/** The HTML part of the mail, as a mailbox shows it, without scripts. */
export const GET = apiRoute({
  verb: getAnnouncement,
  params: episodeParams,
  body: NONE,
  answer: z.unknown(),
  reply: ({ mail }) =>
    new Response(mail.html, {
      headers: {
        'content-type': 'text/html; charset=utf-8',
        'cache-control': 'private, no-store',
        // A mail brings its styles in its elements.
        'content-security-policy':
          "default-src 'none'; style-src 'unsafe-inline'; frame-ancestors 'none'; sandbox",
      },
    }),
});
