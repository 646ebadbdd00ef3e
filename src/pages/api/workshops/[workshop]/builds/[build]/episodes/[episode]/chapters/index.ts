import {
  AddChapterInput,
  ChapterAnswer,
  ChaptersAnswer,
  episodeParams,
} from '../../../../../../../../../features/episodes/episode.ts';
import { addChapter } from '../../../../../../../../../features/episodes/server/add-chapter.ts';
import { listChapters } from '../../../../../../../../../features/episodes/server/list-chapters.ts';
import { apiRoute, NONE } from '../../../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({
  verb: listChapters,
  params: episodeParams,
  body: NONE,
  answer: ChaptersAnswer,
});
export const POST = apiRoute({
  verb: addChapter,
  params: episodeParams,
  body: AddChapterInput,
  answer: ChapterAnswer,
});
