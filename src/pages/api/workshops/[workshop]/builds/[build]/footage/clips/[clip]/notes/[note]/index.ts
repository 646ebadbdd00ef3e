import {
  ChangeClipNoteInput,
  clipNoteParams,
  ClipNoteRow,
} from '../../../../../../../../../../../features/notes/clip-note.ts';
import { changeClipNote } from '../../../../../../../../../../../features/notes/server/change-clip-note.ts';
import { apiRoute } from '../../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeClipNote,
  params: clipNoteParams,
  body: ChangeClipNoteInput,
  answer: ClipNoteRow,
});
