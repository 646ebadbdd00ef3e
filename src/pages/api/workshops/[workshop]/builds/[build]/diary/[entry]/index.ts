import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { ChangeEntryInput, entryParams } from '../../../../../../../../features/diary/diary.ts';
import { changeEntry } from '../../../../../../../../features/diary/server/change-entry.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeEntry,
  params: entryParams,
  body: ChangeEntryInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, entry }) => `${paths.diary(workshop, build)}?edit=${entry}`,
    done: ({ id }, { workshop, build }) => `${paths.diary(workshop, build)}#entry-${id}`,
  },
});
