import { callAuth } from '../../../server/auth/call-auth.ts';
import { hintCookie } from '../../../server/auth/cookies.ts';
import { readRecoveryCode } from '../../../server/auth/recovery-codes.ts';
import { findAtSecondStep, useUpCode } from '../../../server/auth/used-codes.ts';
import { verb } from '../../../server/verb.ts';
import { DONE } from '../account.ts';

/** The second step of signing in: the app's six digits, or one of the recovery codes, which is used up. */
export const verifySecondStep = verb(
  { may: 'account.enter', transaction: false },
  async (context, { kind, code: typed }: { kind: 'code' | 'recovery'; code: string }) => {
    const { api } = context.services.auth;
    const code = kind === 'code' ? typed.replace(/\s/g, '') : readRecoveryCode(typed);
    const account = kind === 'code' ? await findAtSecondStep(context) : null;
    if (account !== null) await useUpCode(context, account, code);
    await callAuth(context, (headers) =>
      kind === 'code'
        ? api.verifyTOTP({ body: { code }, headers, returnHeaders: true })
        : api.verifyBackupCode({ body: { code }, headers, returnHeaders: true }),
    );
    context.setCookies.push(hintCookie(context.services.settings, true));
    return DONE;
  },
);
