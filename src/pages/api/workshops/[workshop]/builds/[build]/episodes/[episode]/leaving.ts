import { episodeParams } from '../../../../../../../../features/episodes/episode.ts';
import { LeavingFileInput } from '../../../../../../../../features/episodes/leaving.ts';
import { getLeavingFile } from '../../../../../../../../features/episodes/server/get-leaving-file.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';
import { replyWithText, TextFile } from '../../../../../../../../server/http/text-file.ts';

/** The text, or the chapters, that go with an episode. */
export const GET = apiRoute({
  verb: getLeavingFile,
  params: episodeParams,
  body: LeavingFileInput,
  answer: TextFile,
  reply: replyWithText,
});
