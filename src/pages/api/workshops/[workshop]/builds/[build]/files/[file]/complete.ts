import { FileId, fileParams } from '../../../../../../../../features/files/file.ts';
import { completeUpload } from '../../../../../../../../features/files/server/complete-upload.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({ verb: completeUpload, params: fileParams, body: NONE, answer: FileId });
