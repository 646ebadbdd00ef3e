import { DeskAnswer } from '../../../../../../../../features/episodes/desk.ts';
import { episodeParams } from '../../../../../../../../features/episodes/episode.ts';
import { getDeskTag } from '../../../../../../../../features/episodes/server/get-desk-tag.ts';
import { lookAtDesk } from '../../../../../../../../features/episodes/server/look-at-desk.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';
import { taggedRoute } from '../../../../../../../../server/http/tagged-route.ts';

export const GET = taggedRoute(
  apiRoute({ verb: lookAtDesk, params: episodeParams, body: NONE, answer: DeskAnswer }),
  getDeskTag,
);
