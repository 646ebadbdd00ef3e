import {
  ChangeNoteInput,
  NoteAnswer,
  noteParams,
} from '../../../../../../../../../../features/notes/note.ts';
import { changeNote } from '../../../../../../../../../../features/notes/server/change-note.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeNote,
  params: noteParams,
  body: ChangeNoteInput,
  answer: NoteAnswer,
});
