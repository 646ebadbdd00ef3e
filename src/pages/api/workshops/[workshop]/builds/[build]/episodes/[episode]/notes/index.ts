import {
  AddNoteInput,
  episodeParams,
  NoteAnswer,
  NotesAnswer,
} from '../../../../../../../../../features/notes/note.ts';
import { addNote } from '../../../../../../../../../features/notes/server/add-note.ts';
import { listNotes } from '../../../../../../../../../features/notes/server/list-notes.ts';
import { apiRoute, NONE } from '../../../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({ verb: listNotes, params: episodeParams, body: NONE, answer: NotesAnswer });
export const POST = apiRoute({
  verb: addNote,
  params: episodeParams,
  body: AddNoteInput,
  answer: NoteAnswer,
});
