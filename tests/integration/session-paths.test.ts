import { expect, test } from 'vitest';
import { importsOf, sourceFiles, sourceText } from '../support/authorisation/find-ruled.ts';

const files = sourceFiles('src', /\.(ts|tsx|astro)$/);

/** better-auth's calls that begin a session, or change the cookie of one. */
const SESSION_CALLS =
  /\bapi\.(signIn\w+|signUp\w+|magicLinkVerify|verify(?:Email|TOTP|OTP|BackupCode)|changePassword|(?:en|dis)ableTwoFactor|createSession|setPassword)\b/g;

/** Which of them a file makes, itself or through what it imports of a feature's server. */
function sessionCallsOf(file: string): string[] {
  const own = [...sourceText(file).matchAll(SESSION_CALLS)].map(([, call]) => call ?? '');
  const imported = importsOf(file).filter((other) => /^src\/features\/.*\/server\//.test(other));
  return [...new Set([...own, ...imported.flatMap(sessionCallsOf)])].sort();
}

test('better-auth’s own addresses are mounted nowhere', () => {
  const mounted = files.filter((file) =>
    /\bauth\.handler\b|toNodeHandler|better-auth\/(node|client|react|next-js)/.test(sourceText(file)),
  );
  expect(mounted).toEqual([]);
});

test('nothing but better-auth writes a session', () => {
  const writers = files.filter((file) =>
    /\.(insert|update)\(sessions\)|internalAdapter(?! \}|\.findVerificationValue\b)/.test(sourceText(file)),
  );
  expect(writers).toEqual([]);
});

test('every address that can begin a session is listed here', () => {
  const routes = files
    .filter((file) => file.startsWith('src/pages/'))
    .map((file) => ({ file: file.replace('src/pages', ''), calls: sessionCallsOf(file) }))
    .filter(({ calls }) => calls.length > 0);
  expect(routes.map(({ file, calls }) => `${file}: ${calls.join(' ')}`)).toMatchInlineSnapshot(`
    [
      "/api/account/ask-link.ts: signInMagicLink",
      "/api/account/confirm.ts: signInEmail verifyEmail",
      "/api/account/new-address.ts: verifyEmail",
      "/api/account/open-link.ts: magicLinkVerify",
      "/api/account/password.ts: changePassword",
      "/api/account/second-factor-confirm.ts: verifyTOTP",
      "/api/account/second-factor-start.ts: enableTwoFactor",
      "/api/account/second-factor-stop.ts: disableTwoFactor",
      "/api/account/second-step.ts: verifyBackupCode verifyTOTP",
      "/api/account/sign-in.ts: signInEmail",
      "/api/account/sign-up.ts: signUpEmail",
    ]
  `);
});
