import { z } from 'zod';
import { clipParams, IdRow, ThumbnailInput } from '../../../../../../../../../features/footage/footage.ts';
import { getThumbnail } from '../../../../../../../../../features/footage/server/get-thumbnail.ts';
import { keepThumbnail } from '../../../../../../../../../features/footage/server/keep-thumbnail.ts';
import { apiRoute, NONE } from '../../../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({
  verb: getThumbnail,
  params: clipParams,
  body: NONE,
  answer: z.unknown(),
  reply: ({ jpeg }) =>
    new Response(Buffer.from(jpeg), {
      headers: { 'content-type': 'image/jpeg', 'cache-control': 'private, max-age=300' },
    }),
});

export const POST = apiRoute({
  verb: keepThumbnail,
  params: clipParams,
  body: ThumbnailInput,
  answer: IdRow,
});
