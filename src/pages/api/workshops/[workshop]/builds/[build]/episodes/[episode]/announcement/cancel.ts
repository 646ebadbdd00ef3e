import {
  AnnouncementVersionInput,
  episodeParams,
  MadeAnnouncement,
} from '../../../../../../../../../features/audience/audience.ts';
import { cancelAnnouncement } from '../../../../../../../../../features/audience/server/cancel-announcement.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: cancelAnnouncement,
  params: episodeParams,
  body: AnnouncementVersionInput,
  answer: MadeAnnouncement,
  form: {
    page: ({ workshop, build, episode }) => paths.announcement(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.announcement(workshop, build, episode),
  },
});
