import { FileId, fileParams } from '../../../../../../../../features/files/file.ts';
import { restoreFile } from '../../../../../../../../features/files/server/restore-file.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({ verb: restoreFile, params: fileParams, body: NONE, answer: FileId });
