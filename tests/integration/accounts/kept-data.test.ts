import { getAuthTables } from 'better-auth/db';
import { getTableColumns } from 'drizzle-orm';
import { getTableConfig } from 'drizzle-orm/pg-core';
import { expect, test } from 'vitest';
import * as tables from '../../../src/db/schema/accounts.ts';
import { askPasswordReset } from '../../../src/features/accounts/server/ask-password-reset.ts';
import { askSignInLink } from '../../../src/features/accounts/server/ask-sign-in-link.ts';
import { askedToken, signInAs, withCookiesOf } from '../../support/account-steps.ts';
import { aPerson, contextFor, PASSWORD } from '../../support/people.ts';
import { testServices } from '../../support/services.ts';

const services = await testServices();

test('tokens of mailed links are kept hashed', async () => {
  const nobody = await contextFor(services, null, null);
  const person = await aPerson(services);
  await askPasswordReset(nobody, { email: person.email });
  await askSignInLink(nobody, { email: person.email });
  const kept = JSON.stringify(await services.db.select().from(tables.verifications));
  expect(kept).toContain(person.id);
  expect(kept).toContain(person.email);
  for (const mail of ['resetPassword', 'signInLink'] as const) {
    expect(kept).not.toContain(askedToken(services, mail));
  }
});

test('what stands between password and second factor is kept hashed too', async () => {
  const person = await aPerson(services, { secondFactor: true });
  const context = await signInAs(services, person.email);
  const cookie = context.setCookies.find((line) => line.includes('two_factor='))!;
  const [identifier = ''] = decodeURIComponent(cookie.split(/[=;]/)[1] ?? '').split(/\.(?=[^.]*$)/);
  const kept = JSON.stringify(await services.db.select().from(tables.verifications));
  expect(identifier.length).toBeGreaterThan(20);
  expect(kept).not.toContain(identifier);
});

test('a password is kept as a hash', async () => {
  await aPerson(services);
  expect(JSON.stringify(await services.db.select().from(tables.credentials))).not.toContain(PASSWORD);
});

test('a cookie is not what is kept of a session', async () => {
  const person = await aPerson(services);
  const signedIn = await withCookiesOf(services, await signInAs(services, person.email));
  const value = decodeURIComponent(
    /session_token=([^;]*)/.exec(signedIn.headers.get('cookie') ?? '')?.[1] ?? '',
  );
  expect(value.length).toBeGreaterThan(40);
  expect(JSON.stringify(await services.db.select().from(tables.sessions))).not.toContain(value);
});

test('our account tables have every field that better-auth reads and writes', () => {
  const ours = {
    user: tables.accounts,
    session: tables.sessions,
    account: tables.credentials,
    verification: tables.verifications,
    twoFactor: tables.secondFactors,
  };
  const theirs = getAuthTables(services.auth.options);
  expect(Object.keys(theirs).sort()).toEqual(Object.keys(ours).sort());
  for (const [name, table] of Object.entries(ours)) {
    const columns = getTableColumns(table);
    const uniqueColumns = getTableConfig(table).uniqueConstraints.flatMap((one) =>
      one.columns.map((column) => column.name),
    );
    expect(Object.keys(columns).sort(), name).toEqual(['id', ...Object.keys(theirs[name]!.fields)].sort());
    for (const [field, { required, unique }] of Object.entries(theirs[name]!.fields)) {
      const column = columns[field as keyof typeof columns];
      if (required === false) expect(column.notNull && !column.hasDefault, `${name}.${field}`).toBe(false);
      if (unique === true) expect(uniqueColumns, `${name}.${field}`).toContain(column.name);
    }
  }
});
