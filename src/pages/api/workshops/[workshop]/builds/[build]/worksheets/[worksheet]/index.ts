import { SavedRow } from '../../../../../../../../features/builds/stage.ts';
import { changeWorksheet } from '../../../../../../../../features/worksheets/server/change-worksheet.ts';
import {
  ChangeWorksheetInput,
  worksheetParams,
} from '../../../../../../../../features/worksheets/worksheet.ts';
import { paths } from '../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeWorksheet,
  params: worksheetParams,
  body: ChangeWorksheetInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build, worksheet }) => paths.benchWorksheet(workshop, build, worksheet),
    done: ({ id }, { workshop, build }) => `${paths.benchWorksheet(workshop, build, id)}?saved=1`,
  },
});
