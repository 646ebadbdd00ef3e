import {
  MadeEpisode,
  VersionInput,
  episodeParams,
} from '../../../../../../../../features/episodes/episode.ts';
import { backToDraft } from '../../../../../../../../features/episodes/server/back-to-draft.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: backToDraft,
  params: episodeParams,
  body: VersionInput,
  answer: MadeEpisode,
  form: {
    page: ({ workshop, build, episode }) => paths.publish(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.publish(workshop, build, episode),
  },
});
