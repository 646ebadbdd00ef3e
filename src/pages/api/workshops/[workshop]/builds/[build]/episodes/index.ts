import { buildParams } from '../../../../../../../features/builds/build.ts';
import { MadeEpisode, MakeEpisodeInput } from '../../../../../../../features/episodes/episode.ts';
import { makeEpisode } from '../../../../../../../features/episodes/server/make-episode.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: makeEpisode,
  params: buildParams,
  body: MakeEpisodeInput,
  answer: MadeEpisode,
  form: {
    page: ({ workshop, build }) => paths.episodes(workshop, build),
    done: ({ id }, { workshop, build }) => paths.desk(workshop, build, id),
  },
});
