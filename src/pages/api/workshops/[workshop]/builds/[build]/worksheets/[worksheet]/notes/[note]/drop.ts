import { z } from 'zod';
import { CarriedAnswer, noteResultParams } from '../../../../../../../../../../features/notes/note-result.ts';
import { dropResult } from '../../../../../../../../../../features/notes/server/drop-result.ts';
import { paths } from '../../../../../../../../../../paths.ts';
import { apiRoute } from '../../../../../../../../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: dropResult,
  params: noteResultParams,
  body: z.object({}),
  answer: CarriedAnswer,
  form: {
    page: ({ workshop, build, worksheet }) => paths.benchWorksheet(workshop, build, worksheet),
    done: (_dropped, { workshop, build, worksheet }) =>
      `${paths.benchWorksheet(workshop, build, worksheet)}#carrying`,
  },
});
