import { callAuth } from '../../../server/auth/call-auth.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** Takes one of the two mailed links of a change of address: the old address approves, or the new one confirms. */
export const confirmNewAddress = verb(
  { may: 'account.own', transaction: false },
  async (context, { token }: { token: string }) => {
    await callAuth(context, (headers) =>
      context.services.auth.api.verifyEmail({ query: { token }, headers, returnHeaders: true }),
    );
    return DONE;
  },
);
