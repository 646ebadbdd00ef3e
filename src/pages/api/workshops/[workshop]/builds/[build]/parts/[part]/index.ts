import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { ChangePartInput, partParams } from '../../../../../../../../features/parts/part.ts';
import { changePart } from '../../../../../../../../features/parts/server/change-part.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changePart,
  params: partParams,
  body: ChangePartInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, part }) => paths.benchPart(workshop, build, part),
    done: ({ id }, { workshop, build }) => `${paths.parts(workshop, build)}#part-${id}`,
  },
});
