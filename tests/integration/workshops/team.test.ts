import { describe, expect, test } from 'vitest';
import { type TeamRole } from '../../../src/domain/roles.ts';
import { changeRole } from '../../../src/features/workshops/server/change-role.ts';
import { leaveTeam } from '../../../src/features/workshops/server/leave-team.ts';
import { removeMember } from '../../../src/features/workshops/server/remove-member.ts';
import { newId } from '../../../src/db/columns.ts';
import { type WorkshopContext } from '../../../src/server/context.ts';
import { isSignedIn } from '../../support/account-steps.ts';
import {
  anotherSession,
  aWorkshop,
  inWorkshop,
  type TestPerson,
  type TestWorkshop,
} from '../../support/people.ts';
import { testServices } from '../../support/services.ts';
import { memberOf } from '../../support/team-steps.ts';

const services = await testServices();

async function idOf(shed: TestWorkshop, person: TestPerson): Promise<string> {
  return (await memberOf(services, shed.id, person.id))!.id;
}

async function give(by: WorkshopContext, shed: TestWorkshop, person: TestPerson, role: TeamRole) {
  return changeRole(by, { member: await idOf(shed, person), role });
}

/** Makes the editor a second owner, with a session and a second factor claimed for the walk through the rule. */
async function secondOwner(shed: TestWorkshop): Promise<WorkshopContext> {
  await give(shed.owner, shed, shed.people.editor, 'owner');
  const headers = await anotherSession(services, shed.people.editor.id);
  const context = await inWorkshop(services, { ...shed.people.editor, headers }, shed.slug);
  if (context.actor.kind !== 'account') throw new Error('The second owner is not signed in.');
  return { ...context, actor: { ...context.actor, secondFactor: true } };
}

const NO_OWNER = { code: 'invalid' };

describe('changing a role', () => {
  test('gives it, and ends the sessions of whoever has it', async () => {
    const shed = await aWorkshop(services);
    await give(shed.owner, shed, shed.people.moderator, 'editor');
    expect(await memberOf(services, shed.id, shed.people.moderator.id)).toMatchObject({ role: 'editor' });
    expect(await isSignedIn(services, shed.people.moderator)).toBe(false);
    expect(await isSignedIn(services, shed.people.editor)).toBe(true);
  });

  test('to the role they have leaves them signed in', async () => {
    const shed = await aWorkshop(services);
    await give(shed.owner, shed, shed.people.editor, 'editor');
    expect(await isSignedIn(services, shed.people.editor)).toBe(true);
  });

  test('refuses a moderator and an editor', async () => {
    const shed = await aWorkshop(services);
    for (const by of [shed.moderator, shed.editor]) {
      await expect(give(by, shed, shed.people.editor, 'owner')).rejects.toMatchObject({ code: 'forbidden' });
    }
  });

  test('does not find another workshop’s, by either address', async () => {
    const shed = await aWorkshop(services);
    await expect(give(shed.outsider, shed, shed.people.editor, 'owner')).rejects.toMatchObject({
      code: 'not_found',
    });
    const theirs = await inWorkshop(services, shed.people.outsider, shed.otherSlug);
    await expect(give(theirs, shed, shed.people.editor, 'owner')).rejects.toMatchObject({
      code: 'not_found',
    });
    await expect(changeRole(shed.owner, { member: newId(), role: 'editor' })).rejects.toMatchObject({
      code: 'not_found',
    });
  });
});

describe('taking someone off the team', () => {
  test('ends their sessions and their place', async () => {
    const shed = await aWorkshop(services);
    await removeMember(shed.owner, { member: await idOf(shed, shed.people.editor) });
    expect(await memberOf(services, shed.id, shed.people.editor.id)).toBeUndefined();
    expect(await isSignedIn(services, shed.people.editor)).toBe(false);
  });

  test('refuses a moderator, and does not find another workshop’s', async () => {
    const shed = await aWorkshop(services);
    const member = await idOf(shed, shed.people.editor);
    await expect(removeMember(shed.moderator, { member })).rejects.toMatchObject({ code: 'forbidden' });
    await expect(removeMember(shed.outsider, { member })).rejects.toMatchObject({ code: 'not_found' });
    const theirs = await inWorkshop(services, shed.people.outsider, shed.otherSlug);
    await expect(removeMember(theirs, { member })).rejects.toMatchObject({ code: 'not_found' });
  });
});

describe('leaving', () => {
  test('ends one’s sessions and place', async () => {
    const shed = await aWorkshop(services);
    await leaveTeam(shed.moderator, undefined);
    expect(await memberOf(services, shed.id, shed.people.moderator.id)).toBeUndefined();
    expect(await isSignedIn(services, shed.people.moderator)).toBe(false);
  });

  test('does not find another workshop’s', async () => {
    const shed = await aWorkshop(services);
    await expect(leaveTeam(shed.outsider, undefined)).rejects.toMatchObject({ code: 'not_found' });
    await expect(leaveTeam(shed.viewer, undefined)).rejects.toMatchObject({ code: 'not_found' });
  });
});

describe('a workshop always has an owner', () => {
  test('the last one cannot leave, be taken off, or get another role', async () => {
    const shed = await aWorkshop(services);
    const { owner } = shed.people;
    await expect(leaveTeam(shed.owner, undefined)).rejects.toMatchObject(NO_OWNER);
    await expect(removeMember(shed.owner, { member: await idOf(shed, owner) })).rejects.toMatchObject(
      NO_OWNER,
    );
    await expect(give(shed.owner, shed, owner, 'editor')).rejects.toMatchObject(NO_OWNER);
    expect(await memberOf(services, shed.id, owner.id)).toMatchObject({ role: 'owner' });
    expect(await isSignedIn(services, owner)).toBe(true);
  });

  test('one of two may leave', async () => {
    const shed = await aWorkshop(services);
    await secondOwner(shed);
    await leaveTeam(shed.owner, undefined);
    expect(await memberOf(services, shed.id, shed.people.editor.id)).toMatchObject({ role: 'owner' });
  });

  test('two who leave at once do not both get away', async () => {
    const shed = await aWorkshop(services);
    const second = await secondOwner(shed);
    const outcomes = await Promise.allSettled([
      leaveTeam(shed.owner, undefined),
      leaveTeam(second, undefined),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  });

  test('two who demote each other at once do not both succeed', async () => {
    const shed = await aWorkshop(services);
    const second = await secondOwner(shed);
    const { owner, editor } = shed.people;
    const outcomes = await Promise.allSettled([
      give(shed.owner, shed, editor, 'moderator'),
      give(second, shed, owner, 'moderator'),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  });
});
