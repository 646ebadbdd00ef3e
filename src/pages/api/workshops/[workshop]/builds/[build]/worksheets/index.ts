import { buildParams } from '../../../../../../../features/builds/build.ts';
import { SavedRow } from '../../../../../../../features/builds/stage.ts';
import { addWorksheet } from '../../../../../../../features/worksheets/server/add-worksheet.ts';
import { AddWorksheetInput } from '../../../../../../../features/worksheets/worksheet.ts';
import { paths } from '../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: addWorksheet,
  params: buildParams,
  body: AddWorksheetInput,
  answer: SavedRow,
  form: {
    page: ({ workshop, build }) => paths.benchWorksheet(workshop, build, 'new'),
    done: ({ id }, { workshop, build }) => paths.benchWorksheet(workshop, build, id),
  },
});
