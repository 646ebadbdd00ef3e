import { episodeParams } from '../../../../../../../../../features/episodes/episode.ts';
import { TakeMarksInput, TakenMarks } from '../../../../../../../../../features/episodes/marks.ts';
import { takeMarks } from '../../../../../../../../../features/episodes/server/take-marks.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: takeMarks,
  params: episodeParams,
  body: TakeMarksInput,
  answer: TakenMarks,
  form: {
    page: ({ workshop, build, episode }) => paths.edit(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.desk(workshop, build, episode),
  },
});
