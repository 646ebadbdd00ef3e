import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { deleteWorksheet } from '../../../../../../../../features/worksheets/server/delete-worksheet.ts';
import {
  WorksheetVersionInput,
  worksheetParams,
} from '../../../../../../../../features/worksheets/worksheet.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: deleteWorksheet,
  params: worksheetParams,
  body: WorksheetVersionInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, worksheet }) => paths.benchWorksheet(workshop, build, worksheet),
    done: ({ id, version }, { workshop, build }) =>
      `${paths.benchWorksheets(workshop, build)}?deleted=${id}&version=${String(version)}`,
  },
});
