import { buildParams } from '../../../../../../../features/builds/build.ts';
import { SavedRow } from '../../../../../../../features/builds/stage.ts';
import { AddEntryInput } from '../../../../../../../features/diary/diary.ts';
import { addEntry } from '../../../../../../../features/diary/server/add-entry.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addEntry,
  params: buildParams,
  body: AddEntryInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => `${paths.diary(workshop, build)}?write=1`,
    done: ({ id }, { workshop, build }) => `${paths.diary(workshop, build)}#entry-${id}`,
  },
});
