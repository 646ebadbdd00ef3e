import { buildParams, MadeBuild } from '../../../../../../features/builds/build.ts';
import { restoreBuild } from '../../../../../../features/builds/server/restore-build.ts';
import { paths } from '../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreBuild,
  params: buildParams,
  body: NONE,
  answer: MadeBuild,
  form: {
    page: ({ workshop }) => paths.newBuild(workshop),
    done: ({ slug }, { workshop }) => paths.buildSettings(workshop, slug),
  },
});
