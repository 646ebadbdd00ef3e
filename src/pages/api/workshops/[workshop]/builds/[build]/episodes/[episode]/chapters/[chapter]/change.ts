import {
  ChapterAnswer,
  chapterParams,
  ChangeChapterInput,
} from '../../../../../../../../../../features/episodes/episode.ts';
import { changeChapter } from '../../../../../../../../../../features/episodes/server/change-chapter.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeChapter,
  params: chapterParams,
  body: ChangeChapterInput,
  answer: ChapterAnswer,
});
