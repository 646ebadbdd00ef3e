import { buildParams } from '../../../../../../../features/builds/build.ts';
import { SavedParts, SavePartsInput } from '../../../../../../../features/parts/part.ts';
import { saveParts } from '../../../../../../../features/parts/server/save-parts.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

/** What the table sends: several rows at once, all or none. */
export const POST = apiRoute({
  verb: saveParts,
  params: buildParams,
  body: SavePartsInput,
  answer: SavedParts,
});
