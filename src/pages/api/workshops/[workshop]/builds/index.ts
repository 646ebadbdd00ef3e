import { MadeBuild, MakeBuildInput } from '../../../../../features/builds/build.ts';
import { makeBuild } from '../../../../../features/builds/server/make-build.ts';
import { workshopParam } from '../../../../../features/workshops/workshop.ts';
import { paths } from '../../../../../paths.ts';
import { apiRoute } from '../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: makeBuild,
  params: workshopParam,
  body: MakeBuildInput,
  answer: MadeBuild,
  form: {
    page: ({ workshop }) => paths.newBuild(workshop),
    done: ({ slug }, { workshop }) => paths.parts(workshop, slug),
  },
});
