import {
  AnnouncementProgress,
  DraftAnnouncementInput,
  episodeParams,
  MadeAnnouncement,
} from '../../../../../../../../../features/audience/audience.ts';
import { draftAnnouncement } from '../../../../../../../../../features/audience/server/draft-announcement.ts';
import { getProgress } from '../../../../../../../../../features/audience/server/get-progress.ts';
import { getProgressTag } from '../../../../../../../../../features/audience/server/get-progress-tag.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute, NONE } from '../../../../../../../../../server/http/api-route.ts';
import { taggedRoute } from '../../../../../../../../../server/http/tagged-route.ts';

export const GET = taggedRoute(
  apiRoute({ verb: getProgress, params: episodeParams, body: NONE, answer: AnnouncementProgress }),
  getProgressTag,
);

export const POST = apiRoute({
  verb: draftAnnouncement,
  params: episodeParams,
  body: DraftAnnouncementInput,
  answer: MadeAnnouncement,
  form: {
    page: ({ workshop, build, episode }) => paths.announcement(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.announcement(workshop, build, episode),
  },
});
