import { changeRole } from '../../../src/features/workshops/server/change-role.ts';
import { listTeam } from '../../../src/features/workshops/server/list-team.ts';
import { joinTeam, type Person } from '../../../src/seed/people.ts';
import { anotherSession, aPerson, aWorkshop, inWorkshop } from '../people.ts';
import { type TestServices } from '../services.ts';
import { type Walker } from './expected.ts';

export interface WalkedWorkshop {
  readonly slug: string;
  readonly people: Readonly<Record<Walker, Person | null>>;
}

/** A workshop with everyone who walks. */
export async function walkedWorkshop(services: TestServices): Promise<WalkedWorkshop> {
  const made = await aWorkshop(services);
  const { owner, editor, moderator, viewer, outsider } = made.people;
  const second = await aPerson(services);
  await joinTeam(services, { owner, slug: made.slug }, second, 'editor');
  const { members } = await listTeam(made.owner, undefined);
  const member = members.find((one) => one.accountId === second.id)!.id;
  await changeRole(await inWorkshop(services, owner, made.slug), { member, role: 'owner' });
  const bare = { ...second, headers: await anotherSession(services, second.id) };
  return {
    slug: made.slug,
    people: {
      nobody: null,
      viewer,
      outsider,
      moderator,
      editor,
      owner,
      'owner without a second factor': bare,
    },
  };
}
