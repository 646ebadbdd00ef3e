import { NoteAnswer, VersionInput, noteParams } from '../../../../../../../../../../features/notes/note.ts';
import { takeProposal } from '../../../../../../../../../../features/notes/server/take-proposal.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: takeProposal,
  params: noteParams,
  body: VersionInput,
  answer: NoteAnswer,
});
