import { buildParams } from '../../../../../../../features/builds/build.ts';
import { exportParts } from '../../../../../../../features/parts/server/export-parts.ts';
import { apiRoute, NONE } from '../../../../../../../server/http/api-route.ts';
import { CsvFile, replyWithCsv } from '../../../../../../../server/http/csv-file.ts';

export const GET = apiRoute({
  verb: exportParts,
  params: buildParams,
  body: NONE,
  answer: CsvFile,
  reply: replyWithCsv,
});
