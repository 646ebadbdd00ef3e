import { editParams, ExportEditInput } from '../../../../../../../../../../features/episodes/edit.ts';
import { exportEdit } from '../../../../../../../../../../features/episodes/server/export-edit.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';
import { replyWithText, TextFile } from '../../../../../../../../../../server/http/text-file.ts';

export const GET = apiRoute({
  verb: exportEdit,
  params: editParams,
  body: ExportEditInput,
  answer: TextFile,
  reply: replyWithText,
});
