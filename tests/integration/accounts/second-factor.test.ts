import { eq } from 'drizzle-orm';
import { describe, expect, test } from 'vitest';
import { secondFactors } from '../../../src/db/schema/accounts.ts';
import { confirmSecondFactor } from '../../../src/features/accounts/server/confirm-second-factor.ts';
import { renewRecoveryCodes } from '../../../src/features/accounts/server/renew-recovery-codes.ts';
import { startSecondFactor } from '../../../src/features/accounts/server/start-second-factor.ts';
import { stopSecondFactor } from '../../../src/features/accounts/server/stop-second-factor.ts';
import { verifySecondStep } from '../../../src/features/accounts/server/verify-second-step.ts';
import { resetSecondFactor } from '../../../src/server/admin/reset-second-factor.ts';
import { appCode, isSignedIn, signInAs, withCookiesOf, wrongCode } from '../../support/account-steps.ts';
import { anotherSession, aPerson, contextFor, PASSWORD, workshopOf } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();

/** Past the password, before the code: what the second step is asked with. */
async function atSecondStep(email: string) {
  const context = await withCookiesOf(services, await signInAs(services, email));
  expect(context.actor.kind).toBe('anyone');
  return context;
}

async function step(email: string, kind: 'code' | 'recovery', code: string) {
  const context = await atSecondStep(email);
  await verifySecondStep(context, { kind, code });
  return withCookiesOf(services, context);
}

async function setUp() {
  const person = await aPerson(services);
  const context = await contextFor(services, person, null);
  const started = await startSecondFactor(context, { password: PASSWORD });
  return { person, context, started };
}

describe('setting it up', () => {
  test('needs the password', async () => {
    const context = await contextFor(services, await aPerson(services), null);
    await expect(startSecondFactor(context, { password: 'not-the-password' })).rejects.toMatchObject({
      fields: { password: 'That is not your password.' },
    });
  });

  test('counts only once the app has shown a right code', async () => {
    const { person, context, started } = await setUp();
    await expect(confirmSecondFactor(context, { code: wrongCode(started.secret) })).rejects.toMatchObject({
      fields: { code: expect.stringContaining('not right') as string },
    });
    const still = await withCookiesOf(services, await signInAs(services, person.email));
    expect(still.actor).toMatchObject({ kind: 'account', secondFactor: false });
    await confirmSecondFactor(context, { code: appCode(started.secret) });
    expect((await withCookiesOf(services, context)).actor).toMatchObject({ secondFactor: true });
    await atSecondStep(person.email);
  });

  test('gives ten recovery codes, and keeps neither them nor the key in plain', async () => {
    const { person, started } = await setUp();
    expect(new Set(started.recoveryCodes).size).toBe(10);
    expect(started.uri).toMatch(/^otpauth:\/\/totp\/Centrepop/);
    const [row] = await services.db.select().from(secondFactors).where(eq(secondFactors.userId, person.id));
    for (const plain of [started.secret, ...started.recoveryCodes]) {
      expect(JSON.stringify(row)).not.toContain(plain);
    }
  });

  test('ends the sessions that began without it', async () => {
    const { person, context, started } = await setUp();
    const elsewhere = { headers: await anotherSession(services, person.id) };
    await confirmSecondFactor(context, { code: appCode(started.secret) });
    expect(await isSignedIn(services, elsewhere)).toBe(false);
    expect(await isSignedIn(services, person)).toBe(false);
  });

  test('is refused while one is on', async () => {
    const person = await aPerson(services, { secondFactor: true });
    await expect(
      startSecondFactor(await contextFor(services, person, null), { password: PASSWORD }),
    ).rejects.toMatchObject({ fields: { '': expect.stringContaining('already on') as string } });
  });
});

describe('the second step', () => {
  test('takes the code of the app, spaces and all', async () => {
    const { email, key } = await aPerson(services, { secondFactor: true });
    const code = appCode(key!);
    const context = await step(email, 'code', `${code.slice(0, 3)} ${code.slice(3)}`);
    expect(context.actor).toMatchObject({ kind: 'account', email, secondFactor: true });
  });

  test('takes a code once, and none older than it', async () => {
    const { email, key } = await aPerson(services, { secondFactor: true });
    const used = { fields: { code: expect.stringContaining('used already') as string } };
    const code = appCode(key!);
    expect((await step(email, 'code', code)).actor.kind).toBe('account');
    const context = await atSecondStep(email);
    const again = (given: string) => verifySecondStep(context, { kind: 'code', code: given });
    await expect(again(code)).rejects.toMatchObject(used);
    await expect(again(appCode(key!, -1))).rejects.toMatchObject(used);
    // Whoever was refused goes on with the next code, without the password again.
    await again(appCode(key!, 1));
    expect((await withCookiesOf(services, context)).actor.kind).toBe('account');
  });

  test('takes one of two at once with the same code', async () => {
    const { email, key } = await aPerson(services, { secondFactor: true });
    const code = appCode(key!);
    const both = [await atSecondStep(email), await atSecondStep(email)];
    const ends = await Promise.allSettled(
      both.map((context) => verifySecondStep(context, { kind: 'code', code })),
    );
    expect(ends.map(({ status }) => status).sort()).toEqual(['fulfilled', 'rejected']);
  });

  test('does not take the code that turned it on', async () => {
    const { person, context, started } = await setUp();
    const code = appCode(started.secret);
    await confirmSecondFactor(context, { code });
    await expect(step(person.email, 'code', code)).rejects.toMatchObject({
      fields: { code: expect.stringContaining('used already') as string },
    });
    expect((await step(person.email, 'code', appCode(started.secret, 1))).actor.kind).toBe('account');
  });

  test('takes a recovery code once, whatever its case and spaces', async () => {
    const person = await aPerson(services, { secondFactor: true });
    const [first = '', second = ''] = person.recoveryCodes;
    expect((await step(person.email, 'recovery', first)).actor.kind).toBe('account');
    await expect(step(person.email, 'recovery', first)).rejects.toMatchObject({
      fields: { code: expect.stringContaining('used before') as string },
    });
    expect(
      (await step(person.email, 'recovery', ` ${second.toUpperCase().replace('-', '  ')} `)).actor.kind,
    ).toBe('account');
  });

  test('is over after five wrong codes; the password is asked for again', async () => {
    const { email, key } = await aPerson(services, { secondFactor: true });
    const context = await atSecondStep(email);
    const wrong = () => verifySecondStep(context, { kind: 'code', code: wrongCode(key!) });
    for (let tries = 0; tries < 5; tries += 1)
      await expect(wrong()).rejects.toMatchObject({ code: 'invalid' });
    const right = verifySecondStep(context, { kind: 'code', code: appCode(key!) });
    await expect(right).rejects.toMatchObject({
      fields: { '': expect.stringContaining('Sign in with your password again') as string },
    });
  });

  test('without the password before it is refused', async () => {
    const { key } = await aPerson(services, { secondFactor: true });
    const nobody = await contextFor(services, null, null);
    await expect(verifySecondStep(nobody, { kind: 'code', code: appCode(key!) })).rejects.toMatchObject({
      fields: { '': expect.stringContaining('Sign in with your password') as string },
    });
  });
});

describe('losing and leaving it', () => {
  test('new recovery codes make the old ones worthless', async () => {
    const person = await aPerson(services, { secondFactor: true });
    const context = await contextFor(services, person, null);
    const { recoveryCodes } = await renewRecoveryCodes(context, { password: PASSWORD });
    await expect(step(person.email, 'recovery', person.recoveryCodes[0]!)).rejects.toMatchObject({
      code: 'invalid',
    });
    expect((await step(person.email, 'recovery', recoveryCodes[0]!)).actor.kind).toBe('account');
  });

  test('whoever owns no workshop turns it off with the password', async () => {
    const person = await aPerson(services, { secondFactor: true });
    const context = await contextFor(services, person, null);
    await expect(stopSecondFactor(context, { password: 'not-the-password' })).rejects.toMatchObject({
      fields: { password: 'That is not your password.' },
    });
    await stopSecondFactor(context, { password: PASSWORD });
    const signedIn = await withCookiesOf(services, await signInAs(services, person.email));
    expect(signedIn.actor).toMatchObject({ secondFactor: false });
  });

  test('an owner cannot turn it off', async () => {
    const owner = await aPerson(services, { secondFactor: true });
    await workshopOf(services, owner);
    await expect(
      stopSecondFactor(await contextFor(services, owner, null), { password: PASSWORD }),
    ).rejects.toMatchObject({ code: 'forbidden' });
    await atSecondStep(owner.email);
  });

  test('the server’s keeper takes it off for someone who lost phone and codes, and ends their sessions', async () => {
    const person = await aPerson(services, { secondFactor: true });
    expect(await resetSecondFactor(services.db, ` ${person.email.toUpperCase()} `)).toContain(person.email);
    expect(await isSignedIn(services, person)).toBe(false);
    const signedIn = await withCookiesOf(services, await signInAs(services, person.email));
    expect(signedIn.actor).toMatchObject({ kind: 'account', secondFactor: false });
    await startSecondFactor(signedIn, { password: PASSWORD });
    await expect(resetSecondFactor(services.db, 'nobody@example.com')).rejects.toThrow('no account');
  });
});
