import {
  ChapterAnswer,
  chapterParams,
  VersionInput,
} from '../../../../../../../../../../features/episodes/episode.ts';
import { restoreChapter } from '../../../../../../../../../../features/episodes/server/restore-chapter.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreChapter,
  params: chapterParams,
  body: VersionInput,
  answer: ChapterAnswer,
});
