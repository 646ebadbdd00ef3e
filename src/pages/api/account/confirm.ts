import { ConfirmAddressInput, SignedIn } from '../../../features/accounts/account.ts';
import { confirmAddress } from '../../../features/accounts/server/confirm-address.ts';
import { paths } from '../../../paths.ts';
import { apiRoute, NONE } from '../../../server/http/api-route.ts';

export const POST = apiRoute({
  verb: confirmAddress,
  params: NONE,
  body: ConfirmAddressInput,
  answer: SignedIn,
  limit: [{ name: 'confirm', by: 'address', tries: 30, seconds: 600 }],
  form: {
    page: (_params, values) => paths.confirmAddress(values['token'] ?? ''),
    done: (result) => (result.secondStep ? paths.secondStep() : paths.bench()),
    secrets: ['password'],
  },
});
