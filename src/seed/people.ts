import { TOTP } from 'otpauth';
import { type InvitedRole } from '../domain/roles.ts';
import { confirmAddress } from '../features/accounts/server/confirm-address.ts';
import { confirmSecondFactor } from '../features/accounts/server/confirm-second-factor.ts';
import { signUp } from '../features/accounts/server/sign-up.ts';
import { startSecondFactor } from '../features/accounts/server/start-second-factor.ts';
import { acceptInvitation } from '../features/workshops/server/accept-invitation.ts';
import { inviteMember } from '../features/workshops/server/invite-member.ts';
import { INVITATION_PURPOSE } from '../features/workshops/workshop.ts';
import { type AccountMails } from '../server/auth/auth.ts';
import { readSession } from '../server/auth/session.ts';
import { signToken } from '../server/auth/signed-token.ts';
import { type Context } from '../server/context.ts';
import { type Services } from '../server/services.ts';
import { findTenant } from '../server/tenant.ts';

/** Someone of the demo, signed in. */
export interface Person {
  readonly name: string;
  readonly email: string;
  readonly headers: Headers;
}

/** The demo's people all have the same password: it exists only on a loopback address. */
export const DEMO_PASSWORD = 'press-and-mill';

/**
 * The context in which someone of the demo acts.
 * @param person null for nobody signed in
 */
export async function contextFor(
  services: Services,
  person: Person | null,
  workshopSlug: string | null,
): Promise<Context> {
  const headers = person?.headers ?? new Headers();
  const { actor } = await readSession(services.auth, services.settings, headers);
  const tenant = workshopSlug === null ? null : await findTenant(services.db, workshopSlug, actor);
  return {
    db: services.db,
    actor,
    workshop: tenant?.workshop ?? null,
    role: tenant?.role ?? (actor.kind === 'account' ? 'viewer' : 'anyone'),
    now: new Date(),
    requestId: 'seed',
    services,
    headers,
    setCookies: [],
  };
}

/** Account mails that let a seed open the confirmation links it has mailed, by the name they were mailed to. */
export function keepConfirmations(mails: AccountMails): {
  readonly mails: AccountMails;
  readonly tokenFor: (name: string) => string;
} {
  const tokens = new Map<string, string>();
  return {
    mails: {
      ...mails,
      confirmAddress: (props) => {
        tokens.set(props.name, props.token);
        return mails.confirmAddress(props);
      },
    },
    tokenFor: (name) => {
      const token = tokens.get(name);
      if (token === undefined) throw new Error(`No confirmation was mailed to ${name}.`);
      return token;
    },
  };
}

/**
 * Signs someone up, confirms the address and signs in.
 * @param tokenFor gives the token of the confirmation mail that was made for a name
 */
export async function makePerson(
  services: Services,
  person: { readonly name: string; readonly email: string },
  tokenFor: (name: string) => string,
): Promise<Person> {
  const context = await contextFor(services, null, null);
  await signUp(context, { ...person, password: DEMO_PASSWORD });
  await confirmAddress(context, { token: tokenFor(person.name), password: DEMO_PASSWORD });
  return { ...person, headers: cookieHeaders(context.setCookies) };
}

/**
 * Sets up a second factor.
 * @returns the person with the session that has it, and the key for an authenticator app
 */
export async function addSecondFactor(
  services: Services,
  person: Person,
): Promise<{ readonly person: Person; readonly key: string }> {
  const context = await contextFor(services, person, null);
  const { secret } = await startSecondFactor(context, { password: DEMO_PASSWORD });
  await confirmSecondFactor(context, { code: new TOTP({ secret }).generate() });
  return { person: { ...person, headers: cookieHeaders(context.setCookies) }, key: secret };
}

/** Invites someone to a team and takes the invitation up for them. */
export async function joinTeam(
  services: Services,
  team: { readonly owner: Person; readonly slug: string },
  person: Person,
  role: InvitedRole,
): Promise<void> {
  const inviting = await contextFor(services, team.owner, team.slug);
  const { id } = await inviteMember(inviting, { email: person.email, role });
  await acceptInvitation(await contextFor(services, person, null), {
    invitation: id,
    token: signToken(services.settings.AUTH_SECRET, INVITATION_PURPOSE, id),
  });
}

/** The cookies that an answer sets, as the next request sends them. */
export function cookieHeaders(setCookies: readonly string[]): Headers {
  const jar = new Map(
    setCookies.map((line) => (line.split(';')[0] ?? '').split(/=(.*)/s) as [string, string]),
  );
  return new Headers({ cookie: [...jar].map(([name, value]) => `${name}=${value}`).join('; ') });
}
