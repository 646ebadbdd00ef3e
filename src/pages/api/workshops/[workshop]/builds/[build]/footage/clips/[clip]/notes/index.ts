import { clipParams } from '../../../../../../../../../../features/footage/footage.ts';
import { AddClipNoteInput, ClipNoteRow } from '../../../../../../../../../../features/notes/clip-note.ts';
import { addClipNote } from '../../../../../../../../../../features/notes/server/add-clip-note.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addClipNote,
  params: clipParams,
  body: AddClipNoteInput,
  answer: ClipNoteRow,
});
