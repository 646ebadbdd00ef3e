import { symmetricDecrypt } from 'better-auth/crypto';
import { eq, lt } from 'drizzle-orm';
import { Secret, TOTP } from 'otpauth';
import { secondFactors, usedCodes } from '../../db/schema/accounts.ts';
import { type Context } from '../context.ts';
import { Invalid } from '../errors.ts';
import { cookiePrefix } from './cookies.ts';

/** Seconds that a code shows, and how many steps before and after now are taken: RFC 6238, section 5.2. */
const STEP_SECONDS = 30;
const WINDOW = 1;

type Parts = Pick<Context, 'db' | 'services' | 'now'>;

/**
 * Uses an app's code up, so that who looked over a shoulder cannot use it again (RFC 6238, section 5.2). better-auth
 * keeps no record of codes; whether this one is right at all is left to it.
 * @throws Invalid for a code of a time step that was used, or that is older than one that was
 */
export async function useUpCode(
  { db, services, now }: Parts,
  accountId: string,
  code: string,
): Promise<void> {
  const [factor] = await db
    .select({ secret: secondFactors.secret })
    .from(secondFactors)
    .where(eq(secondFactors.userId, accountId));
  if (!factor) return;
  const { secretConfig: key } = await services.auth.$context;
  const secret = Secret.fromUTF8(await symmetricDecrypt({ key, data: factor.secret }));
  const timestamp = now.getTime();
  const away = new TOTP({ secret, period: STEP_SECONDS }).validate({
    token: code,
    timestamp,
    window: WINDOW,
  });
  if (away === null) return;
  const step = Math.floor(timestamp / 1000 / STEP_SECONDS) + away;
  const [used] = await db
    .insert(usedCodes)
    .values({ accountId, step })
    .onConflictDoUpdate({ target: usedCodes.accountId, set: { step }, setWhere: lt(usedCodes.step, step) })
    .returning({ step: usedCodes.step });
  if (!used) {
    throw new Invalid({
      code: 'That code was used already. Wait for the next one: codes change every 30 seconds.',
    });
  }
}

/** Who is past their password and owes a code, by the cookie that better-auth gave them; null for nobody. */
export async function findAtSecondStep({ services, headers }: Context): Promise<string | null> {
  const name = `${cookiePrefix(services.settings)}.two_factor`;
  const cookies = (headers.get('cookie') ?? '').split('; ').map((cookie) => cookie.split(/=(.*)/s));
  const [, value = ''] = cookies.find(([given]) => given === name) ?? [];
  // What stands before the signature, which better-auth checks when it is asked.
  const identifier = decodeURIComponent(value).replace(/\.[^.]*$/, '');
  if (identifier === '') return null;
  const { internalAdapter } = await services.auth.$context;
  return (await internalAdapter.findVerificationValue(identifier))?.value ?? null;
}
