import { buildParams } from '../../../../../../../features/builds/build.ts';
import { SavedRow } from '../../../../../../../features/builds/stage.ts';
import { PartInput, PartsAnswer } from '../../../../../../../features/parts/part.ts';
import { addPart } from '../../../../../../../features/parts/server/add-part.ts';
import { listParts } from '../../../../../../../features/parts/server/list-parts.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({ verb: listParts, params: buildParams, body: NONE, answer: PartsAnswer });

export const POST = apiRoute({
  verb: addPart,
  params: buildParams,
  body: PartInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => `${paths.parts(workshop, build)}?add=1`,
    done: ({ id }, { workshop, build }) => `${paths.parts(workshop, build)}?add=1#part-${id}`,
  },
});
