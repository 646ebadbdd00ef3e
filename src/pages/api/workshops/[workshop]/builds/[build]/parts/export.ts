import { z } from 'zod';
import { buildParams } from '../../../../../../../features/builds/build.ts';
import { exportParts } from '../../../../../../../features/parts/server/export-parts.ts';
import { apiRoute, NONE } from '../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({
  verb: exportParts,
  params: buildParams,
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
