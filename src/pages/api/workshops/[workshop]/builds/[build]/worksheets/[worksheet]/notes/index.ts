import { CarriedAnswer, CarryResultInput } from '../../../../../../../../../features/notes/note-result.ts';
import { carryResult } from '../../../../../../../../../features/notes/server/carry-result.ts';
import { worksheetParams } from '../../../../../../../../../features/worksheets/worksheet.ts';
import { paths } from '../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: carryResult,
  params: worksheetParams,
  body: CarryResultInput,
  answer: CarriedAnswer,
  form: {
    page: ({ workshop, build, worksheet }) => paths.benchWorksheet(workshop, build, worksheet),
    done: (_carried, { workshop, build, worksheet }) =>
      `${paths.benchWorksheet(workshop, build, worksheet)}#carrying`,
  },
});
