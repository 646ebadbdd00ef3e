import { readAddressToken } from '../../../server/auth/address-token.ts';
import { callAuth, LINK_IS_OVER } from '../../../server/auth/call-auth.ts';
import { onUniqueViolation } from '../../../server/constraint.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/**
 * Takes one of the two mailed links of a change of address: the old address approves, or the new one confirms.
 * @throws Invalid for a link of another kind, or when someone else has taken the address since
 */
export const confirmNewAddress = verb(
  { may: 'account.own', transaction: false },
  async (context, { token }: { token: string }) => {
    const { updateTo } = await readAddressToken(context.services.settings.AUTH_SECRET, token);
    // The link of a new account is taken by confirmAddress alone, which asks for its password.
    if (updateTo === undefined) throw new Invalid({ '': LINK_IS_OVER });
    await onUniqueViolation({ accounts_email_unique: { '': LINK_IS_OVER } }, () =>
      callAuth(context, (headers) =>
        context.services.auth.api.verifyEmail({ query: { token }, headers, returnHeaders: true }),
      ),
    );
    return DONE;
  },
);
