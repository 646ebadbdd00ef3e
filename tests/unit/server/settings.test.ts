import { describe, expect, test } from 'vitest';
import { isLoopback, readServiceSettings, readSettings, SettingsError } from '../../../src/server/env.ts';

const OPEN = {
  HOST: '0.0.0.0',
  PUBLIC_URL: 'https://shed.example',
  SMTP_URL: 'smtp://mail.example:587',
  MAIL_FROM: 'Shed <post@shed.example>',
  S3_ENDPOINT: 'https://s3.example',
  S3_ACCESS_KEY_ID: 'id',
  S3_SECRET_ACCESS_KEY: 'key',
};
const DATABASE = { DATABASE_URL: 'postgres://u:p@db.example/centrepop', AUTH_SECRET: 's'.repeat(32) };
const GIB = 2 ** 30;

function problemsOf(
  source: Record<string, string | undefined>,
  read = readSettings as (s: typeof source) => unknown,
) {
  try {
    read(source);
  } catch (error) {
    if (error instanceof SettingsError) return error.problems;
    throw error;
  }
  return [];
}

test('with nothing set everything runs on this machine', () => {
  expect(readSettings({})).toMatchObject({
    HOST: '127.0.0.1',
    PORT: 4321,
    PUBLIC_URL: 'http://127.0.0.1:4321',
    TRUSTED_PROXIES: [],
    DATA_DIR: '.data',
    ROLE: 'all',
    MAIL_PER_MINUTE: 600,
    UPLOAD_MAX: 50 * GIB,
    WORKSHOP_QUOTA: 500 * GIB,
    DEMO: true,
  });
  for (const name of ['DATABASE_URL', 'S3_ENDPOINT', 'SMTP_URL', 'AUTH_SECRET'] as const)
    expect(readSettings({})[name]).toBeUndefined();
});

test('an empty value counts as left out', () => {
  const empty = Object.fromEntries(
    ['HOST', 'PORT', 'DATABASE_URL', 'DEMO', 'ROLE'].map((name) => [name, '']),
  );
  expect(readSettings(empty)).toEqual(readSettings({}));
});

test.each([
  [{ HOST: '::1', PORT: '80' }, 'http://[::1]:80'],
  [{ HOST: '[::1]' }, 'http://[::1]:4321'],
  [{ HOST: 'localhost' }, 'http://localhost:4321'],
  [{ PUBLIC_URL: 'https://shed.example//' }, 'https://shed.example'],
])('%j makes the public address %s', (source, url) => {
  expect(readSettings(source).PUBLIC_URL).toBe(url);
});

test.each([
  ['20', 20],
  ['3KiB', 3 * 1024],
  ['2 MiB', 2 * 2 ** 20],
  ['1 TiB', 2 ** 40],
])('a size of %s is %i bytes', (text, bytes) => {
  expect(readSettings({ UPLOAD_MAX: text }).UPLOAD_MAX).toBe(bytes);
});

test('trusted proxies are a list, by commas or spaces', () => {
  expect(readSettings({ TRUSTED_PROXIES: '10.0.0.1, 10.0.0.2  fd00::/8' }).TRUSTED_PROXIES).toEqual([
    '10.0.0.1',
    '10.0.0.2',
    'fd00::/8',
  ]);
});

test.each([
  ['127.0.0.1', true],
  ['127.1.2.3', true],
  ['localhost', true],
  ['::1', true],
  ['0.0.0.0', false],
  ['192.168.1.4', false],
  ['127.0.0.1.example.com', false],
  ['localhost.example', false],
  ['::', false],
])('%s is this machine’s own: %s', (host, expected) => {
  expect(isLoopback(host)).toBe(expected);
});

describe('it refuses to start', () => {
  test('not at all when an open host has mail, files and an https address', () => {
    expect(problemsOf(OPEN)).toEqual([]);
    expect(problemsOf({ ...OPEN, ...DATABASE, ROLE: 'worker' })).toEqual([]);
  });

  test.each<[Record<string, string | undefined>, RegExp]>([
    [{ ...OPEN, SMTP_URL: undefined }, /SMTP_URL is not set: mail would go to the fake/],
    [{ ...OPEN, S3_ENDPOINT: undefined }, /S3_ENDPOINT is not set: files would go to the fake/],
    [{ ...OPEN, PUBLIC_URL: undefined }, /PUBLIC_URL must be set and start with https/],
    [{ ...OPEN, PUBLIC_URL: 'http://shed.example' }, /PUBLIC_URL must be set and start with https/],
    [{ ...OPEN, MAIL_FROM: undefined }, /MAIL_FROM must say/],
    [{ ...OPEN, S3_ACCESS_KEY_ID: undefined }, /S3_ACCESS_KEY_ID must be set/],
    [{ ...OPEN, S3_SECRET_ACCESS_KEY: undefined }, /S3_SECRET_ACCESS_KEY must be set/],
    [{ ...DATABASE, AUTH_SECRET: undefined }, /AUTH_SECRET must be set/],
    [{ DEMO: '1', ...DATABASE }, /DEMO=1 works only/],
    [{ ...OPEN, DEMO: '1' }, /DEMO=1 works only/],
    [{ PORT: '70000' }, /^PORT: /],
    [{ PORT: 'web' }, /^PORT: write a port number/],
    [{ ROLE: 'cook' }, /^ROLE: write all, web or worker/],
    [{ UPLOAD_MAX: 'lots' }, /^UPLOAD_MAX: write a size/],
    [{ PUBLIC_URL: 'ftp://shed.example' }, /^PUBLIC_URL: write a whole address/],
    [{ DATABASE_URL: 'mysql://x/y' }, /^DATABASE_URL: write postgres/],
    [{ SMTP_URL: 'https://mail.example' }, /^SMTP_URL: write smtp/],
    [{ AUTH_SECRET: 'short' }, /^AUTH_SECRET: use at least 32/],
    [{ INSTALLATION_ID: 'Not OK' }, /^INSTALLATION_ID: /],
    [{ DEMO: 'yes' }, /^DEMO: write 0 or 1/],
  ])('with %j', (source, sentence) => {
    const problems = problemsOf(source);
    expect(problems).toHaveLength(1);
    expect(problems[0]).toMatch(sentence);
  });

  test('saying every problem at once', () => {
    expect(problemsOf({ PORT: '0', ROLE: 'cook', UPLOAD_MAX: '-1' })).toHaveLength(3);
    expect(problemsOf({ HOST: '0.0.0.0' })).toHaveLength(3);
    expect(problemsOf({ ROLE: 'web' })).toEqual(
      ['DATABASE_URL', 'S3_ENDPOINT', 'S3_ACCESS_KEY_ID', 'S3_SECRET_ACCESS_KEY', 'SMTP_URL'].map(
        (name) => `ROLE is web, so ${name} must be set.`,
      ),
    );
    expect(problemsOf({}, readServiceSettings)).toHaveLength(6);
  });
});

test('the demo is off with a database of one’s own, and where one says so', () => {
  expect(readSettings(DATABASE).DEMO).toBe(false);
  expect(readSettings(OPEN).DEMO).toBe(false);
  expect(readSettings({ DEMO: '0' }).DEMO).toBe(false);
});
