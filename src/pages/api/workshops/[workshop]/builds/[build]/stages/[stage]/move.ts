import { moveStage } from '../../../../../../../../features/builds/server/move-stage.ts';
import { MoveStageInput, SavedRow, stageParams } from '../../../../../../../../features/builds/stage.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: moveStage,
  params: stageParams,
  body: MoveStageInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.stages(workshop, build),
    done: ({ id }, { workshop, build, to }) => `${paths.stages(workshop, build)}?moved=${to}#stage-${id}`,
  },
});
