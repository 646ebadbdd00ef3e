import { Done, TokenInput } from '../../../features/accounts/account.ts';
import { confirmNewAddress } from '../../../features/accounts/server/confirm-new-address.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: confirmNewAddress,
  params: NONE,
  body: TokenInput,
  answer: Done,
  limit: [{ name: 'new-address', by: 'account', tries: 20, seconds: 3600 }],
  form: {
    page: (_params, values) => paths.confirmNewAddress(values['token'] ?? ''),
    done: () => null,
  },
});
