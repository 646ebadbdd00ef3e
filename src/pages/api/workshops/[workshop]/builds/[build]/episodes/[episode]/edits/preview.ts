import { EditViewAnswer, ReadEditInput } from '../../../../../../../../../features/episodes/edit.ts';
import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import { previewEdit } from '../../../../../../../../../features/episodes/server/preview-edit.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

/** What an edit would be and do; nothing is kept. */
export const POST = apiRoute({
  verb: previewEdit,
  params: episodeParams,
  body: ReadEditInput,
  answer: EditViewAnswer,
  limit: [{ name: 'preview-edit', by: 'account', tries: 120, seconds: 600 }],
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: () => null,
  },
});
