import { makeWorkshop } from '../../../features/workshops/server/make-workshop.ts';
import { MadeWorkshop, MakeWorkshopInput } from '../../../features/workshops/workshop.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: makeWorkshop,
  params: NONE,
  body: MakeWorkshopInput,
  answer: MadeWorkshop,
  limit: [{ name: 'make-workshop', by: 'account', tries: 10, seconds: 86_400 }],
  form: { page: () => paths.newWorkshop(), done: ({ slug }) => paths.today(slug) },
});
