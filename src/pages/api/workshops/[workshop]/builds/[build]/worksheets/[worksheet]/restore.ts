import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { restoreWorksheet } from '../../../../../../../../features/worksheets/server/restore-worksheet.ts';
import {
  WorksheetVersionInput,
  worksheetParams,
} from '../../../../../../../../features/worksheets/worksheet.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: restoreWorksheet,
  params: worksheetParams,
  body: WorksheetVersionInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.benchWorksheets(workshop, build),
    done: ({ id }, { workshop, build }) => paths.benchWorksheet(workshop, build, id),
  },
});
