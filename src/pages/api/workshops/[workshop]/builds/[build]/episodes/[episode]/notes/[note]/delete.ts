import { NoteAnswer, VersionInput, noteParams } from '../../../../../../../../../../features/notes/note.ts';
import { deleteNote } from '../../../../../../../../../../features/notes/server/delete-note.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteNote,
  params: noteParams,
  body: VersionInput,
  answer: NoteAnswer,
});
