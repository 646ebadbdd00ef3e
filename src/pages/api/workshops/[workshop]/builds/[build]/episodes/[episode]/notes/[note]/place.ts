import {
  noteParams,
  PlaceNoteAnswer,
  PlaceNoteInput,
} from '../../../../../../../../../../features/notes/note.ts';
import { placeNote } from '../../../../../../../../../../features/notes/server/place-note.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: placeNote,
  params: noteParams,
  body: PlaceNoteInput,
  answer: PlaceNoteAnswer,
});
