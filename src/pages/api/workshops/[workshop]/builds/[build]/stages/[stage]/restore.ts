import { restoreStage } from '../../../../../../../../features/builds/server/restore-stage.ts';
import { RestoreStageInput, SavedRow, stageParams } from '../../../../../../../../features/builds/stage.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreStage,
  params: stageParams,
  body: RestoreStageInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.stages(workshop, build),
    done: ({ id }, { workshop, build }) => `${paths.stages(workshop, build)}#stage-${id}`,
  },
});
