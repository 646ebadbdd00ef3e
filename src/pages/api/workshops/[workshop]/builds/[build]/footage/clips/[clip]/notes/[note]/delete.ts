import {
  clipNoteParams,
  ClipNoteRow,
  ClipNoteVersion,
} from '../../../../../../../../../../../features/notes/clip-note.ts';
import { deleteClipNote } from '../../../../../../../../../../../features/notes/server/delete-clip-note.ts';
import { apiRoute } from '../../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteClipNote,
  params: clipNoteParams,
  body: ClipNoteVersion,
  answer: ClipNoteRow,
});
