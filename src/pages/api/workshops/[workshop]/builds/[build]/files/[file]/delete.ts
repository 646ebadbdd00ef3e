import { FileId, fileParams } from '../../../../../../../../features/files/file.ts';
import { deleteFile } from '../../../../../../../../features/files/server/delete-file.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({ verb: deleteFile, params: fileParams, body: NONE, answer: FileId });
