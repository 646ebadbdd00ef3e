import {
  SendAnnouncementInput,
  episodeParams,
  MadeAnnouncement,
} from '../../../../../../../../../features/audience/audience.ts';
import { sendAnnouncement } from '../../../../../../../../../features/audience/server/send-announcement.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: sendAnnouncement,
  params: episodeParams,
  body: SendAnnouncementInput,
  answer: MadeAnnouncement,
  form: {
    page: ({ workshop, build, episode }) => paths.announcement(workshop, build, episode),
    done: (_result, { workshop, build, episode }) => paths.announcement(workshop, build, episode),
  },
});
