import { BuildEditInput, TakenEdit } from '../../../../../../../../../features/episodes/edit.ts';
import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import { buildEdit } from '../../../../../../../../../features/episodes/server/build-edit.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: buildEdit,
  params: episodeParams,
  body: BuildEditInput,
  answer: TakenEdit,
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: ({ number }, { workshop, build, episode }) => paths.edit(workshop, build, episode, number),
  },
});
