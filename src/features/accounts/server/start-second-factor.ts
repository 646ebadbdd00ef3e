import { callAuth } from '../../../server/auth/call-auth.ts';
import { verb } from '../../../server/verb.ts';
import { type SecondFactorStart } from '../account.ts';

/** Makes a secret for an authenticator app and ten recovery codes; it counts only once a code has been confirmed. */
export const startSecondFactor = verb(
  { may: 'account.own', transaction: false },
  async (context, { password }: { password: string }): Promise<SecondFactorStart> => {
    const started = await callAuth(context, (headers) =>
      context.services.auth.api.enableTwoFactor({
        body: { password, method: 'totp' },
        headers,
        returnHeaders: true,
      }),
    );
    if (!('totpURI' in started)) throw new Error('better-auth set up something other than an app code.');
    const secret = new URL(started.totpURI).searchParams.get('secret') ?? '';
    return { uri: started.totpURI, secret, recoveryCodes: started.backupCodes };
  },
);
