import {
  FilePage,
  ListFilesInput,
  StartedUpload,
  StartUploadInput,
} from '../../../../../../../features/files/file.ts';
import { buildParams } from '../../../../../../../features/builds/build.ts';
import { getFilesTag } from '../../../../../../../features/files/server/get-files-tag.ts';
import { listFiles } from '../../../../../../../features/files/server/list-files.ts';
import { startUpload } from '../../../../../../../features/files/server/start-upload.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';
import { taggedRoute } from '../../../../../../../server/http/tagged-route.ts';

export const GET = taggedRoute(
  apiRoute({ verb: listFiles, params: buildParams, body: ListFilesInput, answer: FilePage }),
  getFilesTag,
);

export const POST = apiRoute({
  verb: startUpload,
  params: buildParams,
  body: StartUploadInput,
  answer: StartedUpload,
});
