import {
  clipNoteParams,
  ClipNoteRow,
  ClipNoteVersion,
} from '../../../../../../../../../../../features/notes/clip-note.ts';
import { restoreClipNote } from '../../../../../../../../../../../features/notes/server/restore-clip-note.ts';
import { apiRoute } from '../../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreClipNote,
  params: clipNoteParams,
  body: ClipNoteVersion,
  answer: ClipNoteRow,
});
