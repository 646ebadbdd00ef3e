import { eq } from 'drizzle-orm';
import { describe, expect, test } from 'vitest';
import { invitations } from '../../../src/db/schema/workshops.ts';
import { acceptInvitation } from '../../../src/features/workshops/server/accept-invitation.ts';
import { getInvitation } from '../../../src/features/workshops/server/get-invitation.ts';
import { inviteMember } from '../../../src/features/workshops/server/invite-member.ts';
import { listTeam } from '../../../src/features/workshops/server/list-team.ts';
import { listWaitingInvitations } from '../../../src/features/workshops/server/list-waiting.ts';
import { withdrawInvitation } from '../../../src/features/workshops/server/withdraw-invitation.ts';
import { type InvitedRole } from '../../../src/domain/roles.ts';
import { aPerson, aWorkshop, contextFor, type TestPerson } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';
import { invitationToken, memberOf } from '../../support/team-steps.ts';

const services = await testServices();
const shed = await aWorkshop(services);

async function invite(email: string, role: InvitedRole = 'editor') {
  const { id } = await inviteMember(shed.owner, { email, role });
  return { id, token: invitationToken(services, id) };
}

async function accept(person: TestPerson, { id, token }: { id: string; token: string }) {
  return acceptInvitation(await contextFor(services, person, null), { invitation: id, token });
}

async function runOut(id: string) {
  await services.db
    .update(invitations)
    .set({ expiresAt: new Date(0) })
    .where(eq(invitations.id, id));
}

const NOT_FOUND = { code: 'not_found' };

describe('inviting', () => {
  test.each(['editor', 'moderator'] as const)('refuses the %s', async (role) => {
    await expect(
      inviteMember(shed[role], { email: 'new@example.com', role: 'editor' }),
    ).rejects.toMatchObject({
      code: 'forbidden',
    });
  });

  test('does not find another workshop’s', async () => {
    await expect(
      inviteMember(shed.outsider, { email: 'new@example.com', role: 'editor' }),
    ).rejects.toMatchObject(NOT_FOUND);
  });

  test('refuses whoever is on the team, and whoever is invited already', async () => {
    await expect(invite(shed.people.editor.email)).rejects.toMatchObject({
      fields: { email: 'They are on the team already.' },
    });
    await invite('asked@example.com');
    await expect(invite('asked@example.com')).rejects.toMatchObject({
      fields: { email: expect.stringContaining('invited already') as string },
    });
  });

  test('an invitation that has run out makes room for another', async () => {
    const first = await invite('slow@example.com');
    await runOut(first.id);
    const second = await invite('slow@example.com', 'moderator');
    const { invitations: waiting } = await listTeam(shed.owner, undefined);
    expect(waiting.filter(({ email }) => email === 'slow@example.com')).toMatchObject([
      { id: second.id, role: 'moderator' },
    ]);
  });
});

describe('taking an invitation up', () => {
  test.each(['editor', 'moderator'] as const)('makes the invited person %s', async (role) => {
    const person = await aPerson(services);
    const invitation = await invite(person.email, role);
    expect(await accept(person, invitation)).toEqual({ slug: shed.slug });
    expect(await memberOf(services, shed.id, person.id)).toMatchObject({ role });
  });

  test('is refused to a session with another address, which is told whose it is', async () => {
    const person = await aPerson(services);
    const invitation = await invite('somebody@example.com');
    await expect(accept(person, invitation)).rejects.toMatchObject({
      code: 'forbidden',
      message: expect.stringContaining('somebody@example.com') as string,
    });
    expect(await memberOf(services, shed.id, person.id)).toBeUndefined();
  });

  test('happens once, also when tried twice at once', async () => {
    const person = await aPerson(services);
    const invitation = await invite(person.email);
    const context = await contextFor(services, person, null);
    const twice = { invitation: invitation.id, token: invitation.token };
    const outcomes = await Promise.allSettled([
      acceptInvitation(context, twice),
      acceptInvitation(context, twice),
    ]);
    expect(outcomes.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
    await expect(accept(person, invitation)).rejects.toMatchObject(NOT_FOUND);
  });

  test('is not found with a wrong token, a token for another, or none', async () => {
    const person = await aPerson(services);
    const [one, other] = [await invite(person.email), await invite('other@example.com')];
    for (const token of [other.token, `${one.token}x`, '']) {
      await expect(accept(person, { id: one.id, token })).rejects.toMatchObject(NOT_FOUND);
    }
  });

  test('is not found once it has run out or was withdrawn', async () => {
    const person = await aPerson(services);
    const late = await invite(person.email);
    await runOut(late.id);
    await expect(accept(person, late)).rejects.toMatchObject(NOT_FOUND);
    const withdrawn = await invite(person.email);
    await withdrawInvitation(shed.owner, { invitation: withdrawn.id });
    await expect(accept(person, withdrawn)).rejects.toMatchObject(NOT_FOUND);
    expect(await memberOf(services, shed.id, person.id)).toBeUndefined();
  });

  test('the link shows whom it invites to what', async () => {
    const { id: invitation, token } = await invite('shown@example.com', 'moderator');
    const nobody = await contextFor(services, null, null);
    expect(await getInvitation(nobody, { invitation, token })).toEqual({
      email: 'shown@example.com',
      role: 'moderator',
      workshopName: shed.owner.workshop.name,
      inviter: shed.people.owner.name,
    });
  });
});

describe('withdrawing', () => {
  test('refuses a moderator, and does not find another workshop’s', async () => {
    const { id: invitation } = await invite('kept@example.com');
    await expect(withdrawInvitation(shed.moderator, { invitation })).rejects.toMatchObject({
      code: 'forbidden',
    });
    await expect(withdrawInvitation(shed.outsider, { invitation })).rejects.toMatchObject(NOT_FOUND);
    const theirs = await contextFor(services, shed.people.outsider, shed.otherSlug);
    await expect(withdrawInvitation(theirs, { invitation })).rejects.toMatchObject(NOT_FOUND);
    await withdrawInvitation(shed.owner, { invitation });
    await expect(withdrawInvitation(shed.owner, { invitation })).rejects.toMatchObject(NOT_FOUND);
  });
});

test('an invitation that has run out waits for the owner, who can withdraw it', async () => {
  const { id: invitation } = await invite('gone@example.com');
  await runOut(invitation);
  const mentions = async () =>
    (await listWaitingInvitations(shed.owner, undefined)).filter(({ what }) =>
      what.includes('gone@example.com'),
    );
  expect(await mentions()).toMatchObject([{ urgency: 'soon', href: `/bench/${shed.slug}/team` }]);
  const { invitations: listed } = await listTeam(shed.owner, undefined);
  expect(listed.map(({ id }) => id)).toContain(invitation);
  await withdrawInvitation(shed.owner, { invitation });
  expect(await mentions()).toEqual([]);
});

test('only the owner sees addresses', async () => {
  for (const role of ['editor', 'moderator'] as const) {
    const { members, invitations: listed } = await listTeam(shed[role], undefined);
    expect(JSON.stringify(members)).not.toContain('@');
    expect(listed).toEqual([]);
    expect(await listWaitingInvitations(shed[role], undefined)).toEqual([]);
  }
});
