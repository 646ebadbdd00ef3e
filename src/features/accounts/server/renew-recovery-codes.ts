import { callAuth } from '../../../server/auth/call-auth.ts';
import { verb } from '../../../server/verb.ts';

/** Makes new recovery codes; the old ones stop working. They are shown this once. */
export const renewRecoveryCodes = verb(
  { may: 'account.own', transaction: false },
  async (context, { password }: { password: string }) => {
    const { backupCodes } = await callAuth(context, (headers) =>
      context.services.auth.api.generateBackupCodes({ body: { password }, headers, returnHeaders: true }),
    );
    return { recoveryCodes: backupCodes };
  },
);
