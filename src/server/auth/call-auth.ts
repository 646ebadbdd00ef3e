import { isAPIError } from 'better-auth/api';
import { type Context } from '../context.ts';
import { type FieldErrors, Invalid, TooMany } from '../errors.ts';

/** What a mailed link that is used, old or not ours answers. */
export const LINK_IS_OVER = 'This link no longer works: it was used, or is too old. Ask for a new one.';

/** better-auth's error codes as sentences, each at the field it is about; the empty name is the whole form. */
const SENTENCES: Readonly<Record<string, FieldErrors>> = {
  INVALID_EMAIL_OR_PASSWORD: { '': 'That address and password do not go together.' },
  EMAIL_NOT_VERIFIED: {
    '': 'Confirm your address first: open the link in our mail, or have it sent again.',
    unconfirmed: 'yes',
  },
  INVALID_PASSWORD: { password: 'That is not your password.' },
  PASSWORD_TOO_SHORT: { newPassword: 'That password is too short.' },
  PASSWORD_TOO_LONG: { newPassword: 'That password is too long.' },
  INVALID_TOKEN: { '': LINK_IS_OVER },
  TOKEN_EXPIRED: { '': LINK_IS_OVER },
  USER_NOT_FOUND: { '': LINK_IS_OVER },
  INVALID_USER: { '': 'You are signed in with another account. Sign out, then open the link again.' },
  USER_ALREADY_EXISTS_USE_ANOTHER_EMAIL: { '': LINK_IS_OVER },
  INVALID_CODE: {
    code: 'That code is not right. Codes change every 30 seconds; try the one that shows now.',
  },
  INVALID_BACKUP_CODE: { code: 'That recovery code is not right, or was used before.' },
  INVALID_TWO_FACTOR_COOKIE: { '': 'That took too long. Sign in with your password again.' },
  TOO_MANY_ATTEMPTS_REQUEST_NEW_CODE: { '': 'Too many wrong codes. Sign in with your password again.' },
  TOTP_ALREADY_ENABLED: { '': 'A second factor is already on. Turn it off before setting up another.' },
  TOTP_NOT_ENABLED: { '': 'There is no second factor to check. Start setting it up again.' },
  TWO_FACTOR_NOT_ENABLED: { '': 'There is no second factor on this account.' },
  BACKUP_CODES_NOT_ENABLED: { '': 'There are no recovery codes on this account.' },
  LINK_NOT_FOR_THIS_ACCOUNT: {
    '': 'This account signs in with its password: it has a role in a workshop, or a second factor.',
  },
};

/** A refusal of better-auth that no reader can do anything about, by its own code. */
export class AuthRefusal extends Error {
  constructor(
    statusCode: number,
    readonly code: string,
  ) {
    super(`better-auth refused with ${String(statusCode)} ${code}`);
  }
}

/**
 * Calls better-auth for a request: hands its cookies on and says its refusals in our words.
 * @param call one of auth.api's calls, given the request's headers, with returnHeaders
 * @throws Invalid or TooMany for what the reader can do something about, AuthRefusal for the rest
 */
export async function callAuth<Response>(
  context: Context,
  call: (headers: Headers) => Promise<{ response: Response; headers: Headers }>,
): Promise<Response> {
  try {
    const { response, headers } = await call(context.headers);
    context.setCookies.push(...headers.getSetCookie());
    return response;
  } catch (error) {
    throw isAPIError(error) ? refusalOf(error) : error;
  }
}

function refusalOf(error: { statusCode: number; body?: { code?: string | undefined } | undefined }): Error {
  const { statusCode, body } = error;
  // Its link endpoints answer a bad token by redirecting to an error page of theirs.
  if (statusCode === 302) return new Invalid({ '': LINK_IS_OVER });
  const sentence = SENTENCES[body?.code ?? ''];
  if (sentence) return new Invalid(sentence);
  if (statusCode === 429) return new TooMany(15 * 60);
  return new AuthRefusal(statusCode, body?.code ?? '');
}
