import { AddCaptionsInput, AddedCaptions } from '../../../../../../../../features/captions/captions.ts';
import { z } from 'zod';
import { addCaptions } from '../../../../../../../../features/captions/server/add-captions.ts';
import { getDraftCaptions } from '../../../../../../../../features/captions/server/get-draft-captions.ts';
import { episodeParams } from '../../../../../../../../features/episodes/episode.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';

/** The draft's captions as a player takes them. */
export const GET = apiRoute({
  verb: getDraftCaptions,
  params: episodeParams,
  body: NONE,
  answer: z.unknown(),
  reply: ({ webvtt }) =>
    new Response(webvtt, {
      headers: { 'content-type': 'text/vtt; charset=utf-8', 'cache-control': 'private, no-store' },
    }),
});

export const POST = apiRoute({
  verb: addCaptions,
  params: episodeParams,
  body: AddCaptionsInput,
  answer: AddedCaptions,
  form: {
    page: ({ workshop, build, episode }) => paths.desk(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.desk(workshop, build, episode),
  },
});
