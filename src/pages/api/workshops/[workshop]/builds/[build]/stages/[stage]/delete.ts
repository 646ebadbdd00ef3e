import { deleteStage } from '../../../../../../../../features/builds/server/delete-stage.ts';
import { DeleteStageInput, SavedRow, stageParams } from '../../../../../../../../features/builds/stage.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteStage,
  params: stageParams,
  body: DeleteStageInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, stage }) => `${paths.stages(workshop, build)}?delete=${stage}`,
    done: ({ id, version }, { workshop, build }) =>
      `${paths.stages(workshop, build)}?deleted=${id}&version=${String(version)}`,
  },
});
