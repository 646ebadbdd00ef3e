import { buildParams } from '../../../../../../../features/builds/build.ts';
import { addStage } from '../../../../../../../features/builds/server/add-stage.ts';
import { AddStageInput, SavedRow } from '../../../../../../../features/builds/stage.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addStage,
  params: buildParams,
  body: AddStageInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.stages(workshop, build),
    done: ({ id }, { workshop, build }) => `${paths.stages(workshop, build)}#stage-${id}`,
  },
});
