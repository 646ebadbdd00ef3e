import { type APIRoute } from 'astro';
import { isId } from '../../../domain/ids.ts';
import { getMedia } from '../../../features/files/server/get-media.ts';
import { toErrorAnswer } from '../../../server/http/error-answer.ts';
import { answerMedia } from '../../../server/http/media-answer.ts';
import { contextOf } from '../../../server/http/request-context.ts';

/** Photos, films and plans for whoever may have them; for everyone else there is nothing here. */
export const GET: APIRoute = async ({ params, request, locals }) => {
  const { file = '', variant = '' } = params;
  try {
    if (!isId(file)) return notHere();
    const context = await contextOf(locals.parts, null);
    const media = await getMedia(context, { file, variant });
    return await answerMedia(request, media, context.services.storage, context.now);
  } catch (error) {
    const { status, message } = toErrorAnswer(error, locals.requestId, locals.services.log);
    return status === 404 ? notHere() : plain(status, message);
  }
};

export const HEAD = GET;

function notHere(): Response {
  return plain(404, 'This file is not here.');
}

function plain(status: number, sentence: string): Response {
  return new Response(sentence, {
    status,
    headers: { 'content-type': 'text/plain; charset=utf-8', 'cache-control': 'private, no-store' },
  });
}
