import {
  AnswerNoteInput,
  NoteAnswer,
  noteParams,
} from '../../../../../../../../../../features/notes/note.ts';
import { answerNote } from '../../../../../../../../../../features/notes/server/answer-note.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: answerNote,
  params: noteParams,
  body: AnswerNoteInput,
  answer: NoteAnswer,
});
