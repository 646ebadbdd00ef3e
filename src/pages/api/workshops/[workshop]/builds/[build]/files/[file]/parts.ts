import { ListedParts, fileParams } from '../../../../../../../../features/files/file.ts';
import { listParts } from '../../../../../../../../features/files/server/list-parts.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';

export const GET = apiRoute({ verb: listParts, params: fileParams, body: NONE, answer: ListedParts });
