import { z } from 'zod';
import { buildParams } from '../../../../../../../features/builds/build.ts';
import { OutAlreadyInput } from '../../../../../../../features/episodes/episode.ts';
import { bringInEpisodes } from '../../../../../../../features/episodes/server/bring-in-episodes.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: bringInEpisodes,
  params: buildParams,
  body: OutAlreadyInput,
  answer: z.object({ ids: z.array(z.uuid()) }),
  form: {
    page: ({ workshop, build }) => paths.episodesOutAlready(workshop, build),
    done: (_result, { workshop, build }) => paths.episodes(workshop, build),
  },
});
