import { exportSubscribers } from '../../../../../features/audience/server/export-subscribers.ts';
import { workshopParam } from '../../../../../features/workshops/workshop.ts';
import { apiRoute, NONE } from '../../../../../server/http/api-route.ts';
import { CsvFile, replyWithCsv } from '../../../../../server/http/csv-file.ts';

export const GET = apiRoute({
  verb: exportSubscribers,
  params: workshopParam,
  body: NONE,
  answer: CsvFile,
  reply: replyWithCsv,
});
