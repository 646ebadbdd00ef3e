import { NoteAnswer, VersionInput, noteParams } from '../../../../../../../../../../features/notes/note.ts';
import { restoreNote } from '../../../../../../../../../../features/notes/server/restore-note.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreNote,
  params: noteParams,
  body: VersionInput,
  answer: NoteAnswer,
});
