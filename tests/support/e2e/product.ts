import { randomBytes } from 'node:crypto';
import { pino } from 'pino';
import { type InvitedRole } from '../../../src/domain/roles.ts';
import { accountMails } from '../../../src/process-mails.ts';
import { inviteMember } from '../../../src/features/workshops/server/invite-member.ts';
import { makeWorkshop } from '../../../src/features/workshops/server/make-workshop.ts';
import { INVITATION_PURPOSE } from '../../../src/features/workshops/workshop.ts';
import { paths } from '../../../src/paths.ts';
import { joinTeam } from '../../../src/seed/people.ts';
import { hintCookie } from '../../../src/server/auth/cookies.ts';
import { signToken } from '../../../src/server/auth/signed-token.ts';
import { readServiceSettings } from '../../../src/server/env.ts';
import { openServices, type Services } from '../../../src/server/services.ts';
import { aPerson, contextFor, type TestPerson } from '../people.ts';

/** Someone who owns a workshop, signed in with the second factor that owners need. */
export type Owner = TestPerson & { readonly workshop: string };

/** The copy that the specs share, from behind: makes what a spec starts from, by the product's own verbs. */
export interface Product {
  readonly services: Services;
  /** The cookies of someone signed in, as a browser holds them. */
  cookiesOf(person: TestPerson): string[];
  person(name: string): Promise<TestPerson>;
  owner(name: string, workshopName: string): Promise<Owner>;
  /** Invites an address and gives the path that the mail leads to. */
  invite(owner: Owner, email: string, role: InvitedRole): Promise<string>;
  join(owner: Owner, person: TestPerson, role: InvitedRole): Promise<void>;
}

/** Opens a copy's database for one test process: the one that all specs share, or that of these settings. */
export async function openProduct(source: Readonly<Record<string, string | undefined>> = process.env) {
  const settings = readServiceSettings(source);
  const services = await openServices({
    settings,
    log: pino({ level: 'silent' }),
    accountMails: accountMails(settings.PUBLIC_URL),
    worker: false,
  });
  const product: Product = {
    services,
    cookiesOf: ({ headers }) => [
      ...(headers.get('cookie') ?? '').split('; '),
      hintCookie(settings, true).split(';')[0] ?? '',
    ],
    person: (name) => aPerson(services, { name, email: newAddress(name) }),
    async owner(name, workshopName) {
      const owner = await aPerson(services, { name, email: newAddress(name), secondFactor: true });
      const workshop = newSlug(workshopName);
      const input = { name: workshopName, slug: workshop, timeZone: 'Europe/London' };
      await makeWorkshop(await contextFor(services, owner, null), input);
      return { ...owner, workshop };
    },
    async invite(owner, email, role) {
      const context = await contextFor(services, owner, owner.workshop);
      const { id } = await inviteMember(context, { email, role });
      return paths.invitation(id, signToken(settings.AUTH_SECRET, INVITATION_PURPOSE, id));
    },
    join: (owner, person, role) => joinTeam(services, { owner, slug: owner.workshop }, person, role),
  };
  return product;
}

function newSlug(name: string): string {
  return `${name.toLowerCase().replace(/[^a-z0-9]+/g, '-')}-${randomBytes(4).toString('hex')}`;
}

/** An address that nobody else in this run has. */
export function newAddress(name: string): string {
  return `${newSlug(name)}@example.com`;
}
