import { TOTP } from 'otpauth';
import { confirmAddress } from '../../src/features/accounts/server/confirm-address.ts';
import { signIn } from '../../src/features/accounts/server/sign-in.ts';
import { signUp } from '../../src/features/accounts/server/sign-up.ts';
import { cookieHeaders, type Person } from '../../src/seed/people.ts';
import { type Context } from '../../src/server/context.ts';
import { contextFor, PASSWORD } from './people.ts';
import { type AskedMail, type TestServices } from './services.ts';

/** Whether a person's cookies still open a session. */
export async function isSignedIn(services: TestServices, person: Pick<Person, 'headers'>): Promise<boolean> {
  const { actor } = await contextFor(services, { name: '', email: '', ...person }, null);
  return actor.kind === 'account';
}

/** The next request of whoever got this context's cookies. */
export async function withCookiesOf(services: TestServices, context: Context): Promise<Context> {
  return contextFor(services, { name: '', email: '', headers: cookieHeaders(context.setCookies) }, null);
}

/** Signs in by password alone, on a device of its own; the context holds the cookies it gave. */
export async function signInAs(services: TestServices, email: string, password = PASSWORD): Promise<Context> {
  const context = await contextFor(services, null, null);
  await signIn(context, { email, password, next: undefined });
  return context;
}

export async function signUpAs(
  services: TestServices,
  person: { readonly name: string; readonly email: string },
  password = PASSWORD,
): Promise<void> {
  await signUp(await contextFor(services, null, null), { ...person, password });
}

/** Takes a confirmation link; the context holds the cookies it gave. */
export async function confirmWith(
  services: TestServices,
  token: string,
  password = PASSWORD,
): Promise<Context> {
  const context = await contextFor(services, null, null);
  await confirmAddress(context, { token, password });
  return context;
}

/** What an authenticator app shows for a key, now or some steps of 30 seconds from now. */
export function appCode(key: string, steps = 0): string {
  return new TOTP({ secret: key }).generate({ timestamp: Date.now() + steps * 30_000 });
}

/** A code that the app shows neither now nor next to now. */
export function wrongCode(key: string): string {
  const near = [-2, -1, 0, 1, 2].map((steps) => appCode(key, steps));
  return ['000000', '111111', '222222', '333333', '444444', '555555'].find((code) => !near.includes(code))!;
}

/** The token of the newest account mail of a kind. */
export function askedToken(services: TestServices, mail: AskedMail['mail']): string {
  const token = services.asked.findLast((one) => one.mail === mail)?.token;
  if (token === undefined) throw new Error(`No ${mail} was mailed.`);
  return token;
}

/** The account mails that something asks for. */
export async function mailsOf(services: TestServices, work: () => Promise<unknown>): Promise<string[]> {
  const before = services.asked.length;
  await work();
  return services.asked.slice(before).map(({ mail }) => mail);
}
