import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { partParams, PartVersionInput } from '../../../../../../../../features/parts/part.ts';
import { deletePart } from '../../../../../../../../features/parts/server/delete-part.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deletePart,
  params: partParams,
  body: PartVersionInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, part }) => paths.benchPart(workshop, build, part),
    done: ({ id, version }, { workshop, build }) =>
      `${paths.parts(workshop, build)}?deleted=${id}&version=${String(version)}`,
  },
});
