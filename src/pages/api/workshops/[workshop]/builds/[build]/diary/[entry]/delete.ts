import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { EntryVersionInput, entryParams } from '../../../../../../../../features/diary/diary.ts';
import { deleteEntry } from '../../../../../../../../features/diary/server/delete-entry.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteEntry,
  params: entryParams,
  body: EntryVersionInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.diary(workshop, build),
    done: ({ id, version }, { workshop, build }) =>
      `${paths.diary(workshop, build)}?deleted=${id}&version=${String(version)}`,
  },
});
