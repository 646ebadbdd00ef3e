import {
  MadeEpisode,
  SetVideoInput,
  episodeParams,
} from '../../../../../../../../features/episodes/episode.ts';
import { setVideo } from '../../../../../../../../features/episodes/server/set-video.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: setVideo,
  params: episodeParams,
  body: SetVideoInput,
  answer: MadeEpisode,
  form: {
    page: ({ workshop, build, episode }) => paths.desk(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.desk(workshop, build, episode),
  },
});
