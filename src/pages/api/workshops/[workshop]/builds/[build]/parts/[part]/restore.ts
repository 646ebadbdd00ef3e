import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { partParams, PartVersionInput } from '../../../../../../../../features/parts/part.ts';
import { restorePart } from '../../../../../../../../features/parts/server/restore-part.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restorePart,
  params: partParams,
  body: PartVersionInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.parts(workshop, build),
    done: ({ id }, { workshop, build }) => `${paths.parts(workshop, build)}#part-${id}`,
  },
});
