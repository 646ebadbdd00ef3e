import { MoveByCaptionsInput, TakenEdit } from '../../../../../../../../../features/episodes/edit.ts';
import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import { moveByCaptions } from '../../../../../../../../../features/episodes/server/move-by-captions.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: moveByCaptions,
  params: episodeParams,
  body: MoveByCaptionsInput,
  answer: TakenEdit,
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: ({ number }, { workshop, build, episode }) => paths.edit(workshop, build, episode, number),
  },
});
