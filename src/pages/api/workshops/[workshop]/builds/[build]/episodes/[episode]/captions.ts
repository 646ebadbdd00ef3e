import { AddCaptionsInput, AddedCaptions } from '../../../../../../../../features/captions/captions.ts';
import { addCaptions } from '../../../../../../../../features/captions/server/add-captions.ts';
import { episodeParams } from '../../../../../../../../features/episodes/episode.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

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
