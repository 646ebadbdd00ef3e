import { ChangeNameInput, Done } from '../../../features/accounts/account.ts';
import { changeName } from '../../../features/accounts/server/change-name.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: changeName,
  params: NONE,
  body: ChangeNameInput,
  answer: Done,
  form: {
    page: () => paths.account(),
    done: () => paths.account(),
  },
});
