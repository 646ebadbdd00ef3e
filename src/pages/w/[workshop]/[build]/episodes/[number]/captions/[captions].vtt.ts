import { type APIRoute } from 'astro';
import { numberInAddress } from '../../../../../../../features/episodes/companion.ts';
import { getShownCaptions } from '../../../../../../../features/episodes/server/get-shown-captions.ts';
import { keptAnswer, publicContext } from '../../../../../../../server/http/public-answer.ts';

/** The captions of the edition on show, from our own origin: browsers load no others beside a video. */
export const GET: APIRoute = async ({ params, locals }) => {
  const context = await publicContext(locals, params['workshop']);
  const { webvtt, buildId, episodeId } = await getShownCaptions(context, {
    build: params['build'] ?? '',
    number: numberInAddress(params['number']),
    captions: params['captions'] ?? '',
  });
  const tags = [`workshop:${context.workshop.id}`, `build:${buildId}`, `episode:${episodeId}`];
  return keptAnswer(webvtt, 'text/vtt; charset=utf-8', tags);
};
