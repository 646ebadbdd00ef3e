import { type Settings } from '../src/server/env.ts';
import { type Kept } from './kept.ts';

/** Where the stand-ins listen, when they are in use. */
export type StandIns = {
  readonly databaseUrl?: string | undefined;
  readonly s3Port?: number | undefined;
  readonly smtpPort?: number | undefined;
  readonly outboxPort?: number | undefined;
};

export type Environment = Record<string, string | undefined>;

function loopback(port: number): string {
  return `http://127.0.0.1:${String(port)}`;
}

/**
 * The complete environment of a web or worker process: what was given, and for what was not, this copy's own
 * secrets and stand-ins.
 */
export function serviceEnvironment(
  given: Environment,
  settings: Settings,
  kept: Kept,
  parts: StandIns,
): Environment {
  const environment: Environment = {
    ...given,
    HOST: settings.HOST,
    PORT: String(settings.PORT),
    PUBLIC_URL: settings.PUBLIC_URL,
    DATABASE_URL: settings.DATABASE_URL ?? parts.databaseUrl,
    AUTH_SECRET: settings.AUTH_SECRET ?? kept.authSecret,
    INSTALLATION_ID: settings.INSTALLATION_ID ?? kept.installationId,
    MAIL_FROM: settings.MAIL_FROM,
    S3_REGION: settings.S3_REGION,
    S3_BUCKET: settings.S3_BUCKET,
    // The demo is decided here; a process of its own would refuse it beside a DATABASE_URL.
    DEMO: '0',
    // Announces at every start that it will want a newer Node one day.
    AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED: 'true',
  };
  if (parts.s3Port !== undefined) {
    environment['S3_ENDPOINT'] = loopback(parts.s3Port);
    environment['S3_PUBLIC_ENDPOINT'] = loopback(parts.s3Port);
    environment['S3_ACCESS_KEY_ID'] = kept.s3AccessKeyId;
    environment['S3_SECRET_ACCESS_KEY'] = kept.s3SecretAccessKey;
  }
  if (parts.smtpPort !== undefined) environment['SMTP_URL'] = `smtp://127.0.0.1:${String(parts.smtpPort)}`;
  if (parts.outboxPort !== undefined) environment['OUTBOX_URL'] = loopback(parts.outboxPort);
  return environment;
}

/** The environment of the storage stand-in. */
export function fakeS3Environment(
  given: Environment,
  settings: Settings,
  kept: Kept,
  folder: string,
  port: number,
) {
  return {
    ...given,
    FAKE_S3_DIR: folder,
    FAKE_S3_PORT: String(port),
    FAKE_S3_BUCKET: settings.S3_BUCKET,
    FAKE_S3_REGION: settings.S3_REGION,
    FAKE_S3_ACCESS_KEY_ID: kept.s3AccessKeyId,
    FAKE_S3_SECRET_ACCESS_KEY: kept.s3SecretAccessKey,
    FAKE_S3_ALLOW_ORIGIN: new URL(settings.PUBLIC_URL).origin,
  };
}
