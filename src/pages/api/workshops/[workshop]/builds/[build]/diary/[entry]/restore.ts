import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { EntryVersionInput, entryParams } from '../../../../../../../../features/diary/diary.ts';
import { restoreEntry } from '../../../../../../../../features/diary/server/restore-entry.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreEntry,
  params: entryParams,
  body: EntryVersionInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.diary(workshop, build),
    done: ({ id }, { workshop, build }) => `${paths.diary(workshop, build)}#entry-${id}`,
  },
});
