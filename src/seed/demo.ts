import { eq } from 'drizzle-orm';
import { invitations } from '../db/schema/workshops.ts';
import { type InvitedRole } from '../domain/roles.ts';
import { acceptInvitation } from '../features/workshops/server/accept-invitation.ts';
import { inviteMember } from '../features/workshops/server/invite-member.ts';
import { INVITATION_PURPOSE } from '../features/workshops/server/load-open-invitation.ts';
import { makeWorkshop } from '../features/workshops/server/make-workshop.ts';
import { signToken } from '../server/auth/signed-token.ts';
import { type Services } from '../server/services.ts';
import { addSecondFactor, contextFor, DEMO_PASSWORD, makePerson, type Person } from './people.ts';

const SLUG = 'marram-lane';

const PEOPLE = {
  owner: { name: 'Wren Hallam', email: 'wren@marram-lane.example' },
  editor: { name: 'Idris Cole', email: 'idris@marram-lane.example' },
  moderator: { name: 'Tove Askew', email: 'tove@marram-lane.example' },
  viewer: { name: 'Sam Penhale', email: 'sam@example.com' },
  builder: { name: 'Ana Brightwell', email: 'ana@example.com' },
} as const;

/** One line of what `npm start` prints. */
export interface DemoAccount {
  readonly who: string;
  readonly email: string;
  readonly password: string;
  readonly secondFactorKey?: string;
}

/** Fills an empty database with the demo, by the verbs that people use. */
export async function seedDemo(
  services: Services,
  tokenFor: (name: string) => string,
): Promise<DemoAccount[]> {
  const made = await makePerson(services, PEOPLE.owner, tokenFor);
  await makeWorkshop(await contextFor(services, made, null), {
    name: 'Marram Lane Workshop',
    slug: SLUG,
    timeZone: 'Europe/London',
  });
  const { person: owner, key } = await addSecondFactor(services, made);
  await join(services, owner, await makePerson(services, PEOPLE.editor, tokenFor), 'editor');
  await join(services, owner, await makePerson(services, PEOPLE.moderator, tokenFor), 'moderator');
  await makePerson(services, PEOPLE.viewer, tokenFor);
  await makePerson(services, PEOPLE.builder, tokenFor);
  return Object.entries(PEOPLE).map(([who, { email }]) => ({
    who,
    email,
    password: DEMO_PASSWORD,
    ...(who === 'owner' && { secondFactorKey: key }),
  }));
}

async function join(services: Services, owner: Person, person: Person, role: InvitedRole): Promise<void> {
  await inviteMember(await contextFor(services, owner, SLUG), { email: person.email, role });
  const [invitation] = await services.db
    .select({ id: invitations.id })
    .from(invitations)
    .where(eq(invitations.email, person.email));
  if (!invitation) throw new Error(`The invitation of ${person.email} was not kept.`);
  await acceptInvitation(await contextFor(services, person, null), {
    invitation: invitation.id,
    token: signToken(services.settings.AUTH_SECRET, INVITATION_PURPOSE, invitation.id),
  });
}
