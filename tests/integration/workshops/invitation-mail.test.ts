import { eq, sql } from 'drizzle-orm';
import { afterAll, expect, test, vi } from 'vitest';
import { invitations } from '../../../src/db/schema/workshops.ts';
import { acceptInvitation } from '../../../src/features/workshops/server/accept-invitation.ts';
import { inviteMember } from '../../../src/features/workshops/server/invite-member.ts';
import { withdrawInvitation } from '../../../src/features/workshops/server/withdraw-invitation.ts';
import { sendInvitationJob } from '../../../src/features/workshops/jobs.ts';
import { workQueue } from '../../../src/server/jobs/queue.ts';
import { aPerson, aWorkshop, contextFor } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';
import { invitationToken } from '../../support/team-steps.ts';

const services = await testServices({ worker: true });
const shed = await aWorkshop(services);

/** How each run of the job ended, by the invitation it was about. */
const runs: { invitation: string | undefined; outcome: 'done' | 'failed' }[] = [];

await workQueue(services.jobs, [{ ...sendInvitationJob, retryDelaySeconds: 1 }], async (definition, ids) => {
  const handle = await definition.load();
  const note = (outcome: 'done' | 'failed') => runs.push({ invitation: ids['invitationId'], outcome });
  await handle(services, ids).then(
    () => note('done'),
    (error: unknown) => {
      note('failed');
      throw error;
    },
  );
});
afterAll(() => services.jobs.boss.offWork(sendInvitationJob.name));

const outcomesOf = (id: string) =>
  runs.filter(({ invitation }) => invitation === id).map(({ outcome }) => outcome);

async function untilRun(id: string): Promise<void> {
  await vi.waitFor(() => expect(outcomesOf(id)).toContain('done'), { timeout: 20_000 });
}

test('an invitation is mailed once, with a link that can be taken up', async () => {
  const person = await aPerson(services);
  const { id } = await inviteMember(shed.owner, { email: person.email, role: 'editor' });
  await untilRun(id);
  const [message, ...more] = await services.outbox.messages({ to: person.email });
  expect(more).toEqual([]);
  expect(message).toMatchObject({
    subject: `${shed.owner.workshop.name}: you are invited as editor`,
    links: [`http://shed.test/invitations/${id}?token=${invitationToken(services, id)}`],
    messageId: `<invitation.${id}@shed.test>`,
  });
  const token = new URL(message!.links[0]!).searchParams.get('token')!;
  const context = await contextFor(services, person, null);
  expect(await acceptInvitation(context, { invitation: id, token })).toEqual({ slug: shed.slug });
});

test('handling it twice does no harm: the same mail, under the same Message-ID', async () => {
  const { id } = await inviteMember(shed.owner, { email: 'double@example.com', role: 'editor' });
  await untilRun(id);
  await (
    await sendInvitationJob.load()
  )(services, { invitationId: id });
  const [first, second] = await services.outbox.messages({ to: 'double@example.com' });
  expect(first).toMatchObject({ messageId: second!.messageId, links: second!.links, text: second!.text });
});

test('it is tried again when the mail server asks to wait, and arrives once', async () => {
  await services.outbox.tell({ recipient: 'busy@example.com', answer: 'defer', times: 1 });
  const { id } = await inviteMember(shed.owner, { email: 'busy@example.com', role: 'moderator' });
  await untilRun(id);
  expect(outcomesOf(id)).toEqual(['failed', 'done']);
  expect(await services.outbox.messages({ to: 'busy@example.com' })).toHaveLength(1);
  services.logged.splice(0);
});

test('one that was withdrawn, has run out or is gone is mailed no more, and ends quietly', async () => {
  const handle = await sendInvitationJob.load();
  const { id: withdrawn } = await inviteMember(shed.owner, {
    email: 'withdrawn@example.com',
    role: 'editor',
  });
  const { id: late } = await inviteMember(shed.owner, { email: 'late@example.com', role: 'editor' });
  await Promise.all([untilRun(withdrawn), untilRun(late)]);
  await withdrawInvitation(shed.owner, { invitation: withdrawn });
  await services.db
    .update(invitations)
    .set({ expiresAt: new Date(0) })
    .where(eq(invitations.id, late));
  for (const invitationId of [withdrawn, late, '01890000-0000-7000-8000-000000000000'])
    await handle(services, { invitationId });
  expect(await services.outbox.messages({ to: 'withdrawn@example.com' })).toHaveLength(1);
  expect(await services.outbox.messages({ to: 'late@example.com' })).toHaveLength(1);
});

test('what is rolled back tells nobody', async () => {
  const waiting = () =>
    services.db.execute(sql`select count(*)::int as n from pgboss.job where data::text like '%rolled-back%'`);
  const stop = new Error('Nothing of this is to stay.');
  const write = services.db.transaction(async (db) => {
    await services.jobs.enqueue(db, 'invitation-made', { invitationId: 'rolled-back' });
    expect((await waiting()).rows).toEqual([{ n: 0 }]);
    throw stop;
  });
  await expect(write).rejects.toBe(stop);
  expect((await waiting()).rows).toEqual([{ n: 0 }]);
});
