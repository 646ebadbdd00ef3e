import {
  AppearanceAnswer,
  AppearanceInput,
  AppearancesAnswer,
  episodeParams,
} from '../../../../../../../../../features/notes/note.ts';
import { listAppearances } from '../../../../../../../../../features/notes/server/list-appearances.ts';
import { setAppearance } from '../../../../../../../../../features/notes/server/set-appearance.ts';
import { apiRoute, NONE } from '../../../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({
  verb: listAppearances,
  params: episodeParams,
  body: NONE,
  answer: AppearancesAnswer,
});
export const POST = apiRoute({
  verb: setAppearance,
  params: episodeParams,
  body: AppearanceInput,
  answer: AppearanceAnswer,
});
