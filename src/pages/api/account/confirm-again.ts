import { AddressInput, Done } from '../../../features/accounts/account.ts';
import { sendConfirmationAgain } from '../../../features/accounts/server/send-confirmation-again.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: sendConfirmationAgain,
  params: NONE,
  body: AddressInput,
  answer: Done,
  limit: [
    { name: 'confirm-again', by: 'address', tries: 20, seconds: 3600 },
    { name: 'confirm-again', by: 'email', tries: 3, seconds: 3600 },
  ],
  form: {
    page: () => paths.checkMail(),
    done: () => paths.checkMail(),
  },
});
