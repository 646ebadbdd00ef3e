import {
  ChangeEpisodeInput,
  EpisodeAnswer,
  episodeParams,
} from '../../../../../../../../features/episodes/episode.ts';
import { changeEpisode } from '../../../../../../../../features/episodes/server/change-episode.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeEpisode,
  params: episodeParams,
  body: ChangeEpisodeInput,
  answer: EpisodeAnswer,
  form: {
    page: ({ workshop, build, episode }) => paths.desk(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.desk(workshop, build, episode),
  },
});
