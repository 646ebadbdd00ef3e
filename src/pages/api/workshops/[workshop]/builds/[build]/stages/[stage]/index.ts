import { changeStage } from '../../../../../../../../features/builds/server/change-stage.ts';
import { ChangeStageInput, SavedRow, stageParams } from '../../../../../../../../features/builds/stage.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeStage,
  params: stageParams,
  body: ChangeStageInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, stage }) => `${paths.stages(workshop, build)}?edit=${stage}`,
    done: ({ id }, { workshop, build }) => `${paths.stages(workshop, build)}#stage-${id}`,
  },
});
