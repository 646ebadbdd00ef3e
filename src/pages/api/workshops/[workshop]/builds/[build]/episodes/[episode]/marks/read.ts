import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import { OfferedMarks, ReadMarksInput } from '../../../../../../../../../features/episodes/marks.ts';
import { readMarkFile } from '../../../../../../../../../features/episodes/server/read-mark-file.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

/** The marks of a file, to be chosen from; nothing is kept. */
export const POST = apiRoute({
  verb: readMarkFile,
  params: episodeParams,
  body: ReadMarksInput,
  answer: OfferedMarks,
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: () => null,
  },
});
