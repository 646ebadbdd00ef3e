import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import {
  AcceptChaptersInput,
  AcceptedChapters,
} from '../../../../../../../../../features/episodes/leaving.ts';
import { acceptChapters } from '../../../../../../../../../features/episodes/server/accept-chapters.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: acceptChapters,
  params: episodeParams,
  body: AcceptChaptersInput,
  answer: AcceptedChapters,
  form: {
    page: ({ workshop, build, episode }) => paths.leaving(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.leaving(workshop, build, episode),
  },
});
