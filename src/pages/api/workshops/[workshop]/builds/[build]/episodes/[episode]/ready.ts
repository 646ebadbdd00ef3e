import {
  MadeEpisode,
  VersionInput,
  episodeParams,
} from '../../../../../../../../features/episodes/episode.ts';
import { askToPublish } from '../../../../../../../../features/episodes/server/ask-to-publish.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: askToPublish,
  params: episodeParams,
  body: VersionInput,
  answer: MadeEpisode,
  form: {
    page: ({ workshop, build, episode }) => paths.publish(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.publish(workshop, build, episode),
  },
});
