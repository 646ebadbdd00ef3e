import {
  MadeEpisode,
  VersionInput,
  episodeParams,
} from '../../../../../../../../features/episodes/episode.ts';
import { deleteEpisode } from '../../../../../../../../features/episodes/server/delete-episode.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteEpisode,
  params: episodeParams,
  body: VersionInput,
  answer: MadeEpisode,
  form: {
    page: ({ workshop, build, episode }) => paths.desk(workshop, build, episode),
    done: (_result, { workshop, build }) => paths.episodes(workshop, build),
  },
});
