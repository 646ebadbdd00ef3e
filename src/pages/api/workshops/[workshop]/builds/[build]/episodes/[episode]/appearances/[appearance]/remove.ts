import { RemovedAnswer, appearanceParams } from '../../../../../../../../../../features/notes/note.ts';
import { removeAppearance } from '../../../../../../../../../../features/notes/server/remove-appearance.ts';
import { apiRoute, NONE } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: removeAppearance,
  params: appearanceParams,
  body: NONE,
  answer: RemovedAnswer,
});
