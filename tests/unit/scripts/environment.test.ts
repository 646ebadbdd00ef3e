import { expect, test } from 'vitest';
import { serviceEnvironment } from '../../../scripts/environment.ts';
import { type Kept } from '../../../scripts/kept.ts';
import { readServiceSettings, readSettings } from '../../../src/server/env.ts';

const KEPT: Kept = {
  installationId: 'ab12cd34',
  authSecret: 'a-secret-that-this-copy-has-made-up-itself',
  databasePassword: 'd',
  superuserPassword: 's',
  s3AccessKeyId: 'KEY',
  s3SecretAccessKey: 'secret',
  ports: {},
};

const STAND_INS = {
  databaseUrl: 'postgres://centrepop:d@127.0.0.1:20000/centrepop',
  s3Port: 20001,
  smtpPort: 20002,
  outboxPort: 20003,
};

test('with nothing set a process gets everything that it needs', () => {
  const environment = serviceEnvironment({}, readSettings({}), KEPT, STAND_INS);
  expect(readServiceSettings({ ...environment, ROLE: 'web' })).toMatchObject({
    DATABASE_URL: STAND_INS.databaseUrl,
    S3_ENDPOINT: 'http://127.0.0.1:20001',
    S3_PUBLIC_ENDPOINT: 'http://127.0.0.1:20001',
    S3_ACCESS_KEY_ID: 'KEY',
    SMTP_URL: 'smtp://127.0.0.1:20002',
    AUTH_SECRET: KEPT.authSecret,
    INSTALLATION_ID: 'ab12cd34',
    PUBLIC_URL: 'http://127.0.0.1:4321',
  });
  expect(environment['OUTBOX_URL']).toBe('http://127.0.0.1:20003');
});

test('what is given is passed on as it is', () => {
  const given = {
    DATABASE_URL: 'postgres://diary:x@db.example/diary',
    AUTH_SECRET: 'the-same-secret-for-every-process-of-it',
    S3_ENDPOINT: 'https://files.example',
    S3_ACCESS_KEY_ID: 'given',
    S3_SECRET_ACCESS_KEY: 'given-too',
    SMTP_URL: 'smtp://mail.example',
    MAIL_FROM: 'Diary <diary@workshop.example>',
    UPLOAD_MAX: '2 GiB',
  };
  const environment = serviceEnvironment(given, readSettings(given), KEPT, {});
  expect(environment).toMatchObject(given);
  expect(environment['OUTBOX_URL']).toBeUndefined();
});
