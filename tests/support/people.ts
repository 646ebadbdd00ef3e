import { generateRandomString, hashPassword, makeSignature, symmetricEncrypt } from 'better-auth/crypto';
import { eq } from 'drizzle-orm';
import { Secret } from 'otpauth';
import { newId } from '../../src/db/columns.ts';
import { accounts, credentials, secondFactors } from '../../src/db/schema/accounts.ts';
import { makeWorkshop } from '../../src/features/workshops/server/make-workshop.ts';
import { contextFor, DEMO_PASSWORD, joinTeam, type Person } from '../../src/seed/people.ts';
import { makeRecoveryCodes } from '../../src/server/auth/recovery-codes.ts';
import { type Context, type WorkshopContext } from '../../src/server/context.ts';
import { type Services } from '../../src/server/services.ts';

export { contextFor, type Person } from '../../src/seed/people.ts';

/** Everyone's password. */
export const PASSWORD = DEMO_PASSWORD;

/** Someone signed in, with what a second factor gave them when they have one. */
export interface TestPerson extends Person {
  readonly id: string;
  /** The key of their authenticator app. */
  readonly key: string | null;
  readonly recoveryCodes: readonly string[];
}

let counter = 0;
let passwordHash: Promise<string> | undefined;

/**
 * Someone with a confirmed address, signed in, put straight into the database: quick, because no password is hashed
 * or checked. Where signing up or in is the point, use `makePerson` and `addSecondFactor` of src/seed/people.ts.
 * @param person a name and address of their own when left out; `secondFactor` gives them one
 */
export async function aPerson(
  services: Services,
  person: { readonly name?: string; readonly email?: string; readonly secondFactor?: boolean } = {},
): Promise<TestPerson> {
  counter += 1;
  const id = newId();
  const { name = `Maker ${String(counter)}`, email = `maker-${String(counter)}@example.com` } = person;
  passwordHash ??= hashPassword(PASSWORD);
  const password = await passwordHash;
  await services.db.insert(accounts).values({ id, name, email, emailVerified: true });
  await services.db
    .insert(credentials)
    .values({ accountId: id, userId: id, providerId: 'credential', password });
  const guard = person.secondFactor ? await guardAccount(services, id) : { key: null, recoveryCodes: [] };
  return { id, name, email, headers: await anotherSession(services, id), ...guard };
}

/** Gives an account a second factor, kept as better-auth keeps it. */
async function guardAccount(services: Services, accountId: string) {
  const { secretConfig: key } = await services.auth.$context;
  const [secret, recoveryCodes] = [generateRandomString(32), makeRecoveryCodes()];
  await services.db.insert(secondFactors).values({
    userId: accountId,
    secret: await symmetricEncrypt({ key, data: secret }),
    backupCodes: await symmetricEncrypt({ key, data: JSON.stringify(recoveryCodes) }),
  });
  await services.db.update(accounts).set({ twoFactorEnabled: true }).where(eq(accounts.id, accountId));
  return { key: Secret.fromUTF8(secret).base32, recoveryCodes };
}

/** A further session of someone, as on another device: the cookies it sends. */
export async function anotherSession(services: Services, accountId: string): Promise<Headers> {
  const { internalAdapter, authCookies, secret } = await services.auth.$context;
  const { token } = await internalAdapter.createSession(accountId);
  const signed = encodeURIComponent(`${token}.${await makeSignature(token, secret)}`);
  return new Headers({ cookie: `${authCookies.sessionToken.name}=${signed}` });
}

/** A workshop with its team, and how each of them and everyone else stands in it. */
export interface TestWorkshop {
  readonly id: string;
  readonly slug: string;
  readonly people: Readonly<Record<'owner' | 'editor' | 'moderator' | 'viewer' | 'outsider', TestPerson>>;
  /** With a second factor. */
  readonly owner: WorkshopContext;
  readonly editor: WorkshopContext;
  readonly moderator: WorkshopContext;
  /** Signed in, with no role anywhere. */
  readonly viewer: WorkshopContext;
  /** The owner of another workshop, `otherSlug`, with a second factor. */
  readonly outsider: WorkshopContext;
  readonly anyone: WorkshopContext;
  readonly otherSlug: string;
}

/**
 * Makes a workshop and its team by the product's own verbs, and another workshop beside it. A tenant of its own for
 * one test, or for a file whose tests only read. Contexts are as of now: after a change of roles ask
 * `contextFor(services, person, slug)` for a new one.
 */
export async function aWorkshop(services: Services): Promise<TestWorkshop> {
  const [owner, editor, moderator, viewer, outsider] = await Promise.all([
    aPerson(services, { secondFactor: true }),
    aPerson(services),
    aPerson(services),
    aPerson(services),
    aPerson(services, { secondFactor: true }),
  ]);
  const { id, slug } = await workshopOf(services, owner);
  const { slug: otherSlug } = await workshopOf(services, outsider);
  await joinTeam(services, { owner, slug }, editor, 'editor');
  await joinTeam(services, { owner, slug }, moderator, 'moderator');
  const people = { owner, editor, moderator, viewer, outsider };
  const inIt = (person: Person | null) => inWorkshop(services, person, slug);
  return {
    id,
    slug,
    otherSlug,
    people,
    owner: await inIt(owner),
    editor: await inIt(editor),
    moderator: await inIt(moderator),
    viewer: await inIt(viewer),
    outsider: await inIt(outsider),
    anyone: await inIt(null),
  };
}

/** Makes a workshop for someone, who becomes its owner. */
export async function workshopOf(services: Services, person: Person): Promise<{ id: string; slug: string }> {
  counter += 1;
  const slug = `shed-${String(counter)}`;
  const context = await contextFor(services, person, null);
  return makeWorkshop(context, { name: `Shed ${String(counter)}`, slug, timeZone: 'Europe/London' });
}

/** The context of someone in a workshop that is there. */
export async function inWorkshop(
  services: Services,
  person: Person | null,
  slug: string,
): Promise<WorkshopContext> {
  const context: Context = await contextFor(services, person, slug);
  if (context.workshop === null) throw new Error(`There is no workshop ${slug}.`);
  return { ...context, workshop: context.workshop };
}
