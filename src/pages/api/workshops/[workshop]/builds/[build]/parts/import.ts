import { buildParams } from '../../../../../../../features/builds/build.ts';
import { ImportAnswer, ImportListInput } from '../../../../../../../features/parts/import-list.ts';
import { importParts } from '../../../../../../../features/parts/server/import-parts.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: importParts,
  params: buildParams,
  body: ImportListInput,
  answer: ImportAnswer,
  limit: [{ name: 'import-parts', by: 'account', tries: 60, seconds: 600 }],
  form: {
    page: ({ workshop, build }) => paths.importParts(workshop, build),
    done: ({ taken }, { workshop, build }) =>
      taken === null
        ? null
        : `${paths.parts(workshop, build)}?imported=${String(taken.added)}+${String(taken.updated)}`,
  },
});
