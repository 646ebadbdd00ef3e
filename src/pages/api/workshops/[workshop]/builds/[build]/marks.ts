import { buildParams } from '../../../../../../features/builds/build.ts';
import { ExportClipMarksInput } from '../../../../../../features/episodes/edit.ts';
import { exportClipMarks } from '../../../../../../features/episodes/server/export-clip-marks.ts';
import { apiRoute } from '../../../../../../server/http/api-route.ts';
import { replyWithText, TextFile } from '../../../../../../server/http/text-file.ts';

/** The notes of a build on its clips, for an editing program. */
export const GET = apiRoute({
  verb: exportClipMarks,
  params: buildParams,
  body: ExportClipMarksInput,
  answer: TextFile,
  reply: replyWithText,
});
