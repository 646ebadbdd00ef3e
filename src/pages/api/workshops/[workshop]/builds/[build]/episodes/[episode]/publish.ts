import {
  MadeEpisode,
  PublishInput,
  episodeParams,
} from '../../../../../../../../features/episodes/episode.ts';
import { publishEdition } from '../../../../../../../../features/episodes/server/publish-edition.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: publishEdition,
  params: episodeParams,
  body: PublishInput,
  answer: MadeEpisode,
  form: {
    page: ({ workshop, build, episode }) => paths.publish(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.publish(workshop, build, episode),
  },
});
