import {
  ChapterAnswer,
  chapterParams,
  VersionInput,
} from '../../../../../../../../../../features/episodes/episode.ts';
import { deleteChapter } from '../../../../../../../../../../features/episodes/server/delete-chapter.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteChapter,
  params: chapterParams,
  body: VersionInput,
  answer: ChapterAnswer,
});
