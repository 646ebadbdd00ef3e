import { ReadEditInput, TakenEdit } from '../../../../../../../../../features/episodes/edit.ts';
import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import { takeEdit } from '../../../../../../../../../features/episodes/server/take-edit.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: takeEdit,
  params: episodeParams,
  body: ReadEditInput,
  answer: TakenEdit,
  limit: [{ name: 'take-edit', by: 'account', tries: 60, seconds: 600 }],
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: ({ number }, { workshop, build, episode }) => paths.edit(workshop, build, episode, number),
  },
});
