import { buildParams, DeleteBuildInput, MadeBuild } from '../../../../../../features/builds/build.ts';
import { deleteBuild } from '../../../../../../features/builds/server/delete-build.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteBuild,
  params: buildParams,
  body: DeleteBuildInput,
  answer: MadeBuild,
  form: {
    page: ({ workshop, build }) => paths.buildSettings(workshop, build),
    done: (_result, { workshop }) => `${paths.newBuild(workshop)}#deleted`,
  },
});
