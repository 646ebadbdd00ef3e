import { buildParams, ChangeBuildInput, MadeBuild } from '../../../../../../features/builds/build.ts';
import { changeBuild } from '../../../../../../features/builds/server/change-build.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeBuild,
  params: buildParams,
  body: ChangeBuildInput,
  answer: MadeBuild,
  form: {
    page: ({ workshop, build }) => paths.buildSettings(workshop, build),
    done: ({ slug }, { workshop }) => `${paths.buildSettings(workshop, slug)}?saved=1`,
  },
});
