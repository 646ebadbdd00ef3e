import { FileId, fileParams } from '../../../../../../../../features/files/file.ts';
import { abandonUpload } from '../../../../../../../../features/files/server/abandon-upload.ts';
import { apiRoute, NONE } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({ verb: abandonUpload, params: fileParams, body: NONE, answer: FileId });
