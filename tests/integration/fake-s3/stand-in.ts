import { S3Client, type S3ClientConfig } from '@aws-sdk/client-s3';
import { createHash } from 'node:crypto';
import { startFakeS3, type FakeS3Options } from '../../../fake-s3/server.ts';
import { throwawayFolder } from '../../support/throwaway.ts';

// The SDK announces on stderr that it will want a newer Node one day; the product's settings silence it too.
process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';

export const BUCKET = 'workshop-media';
export const REGION = 'eu-central-1';
export const CREDENTIALS = { accessKeyId: 'MARRAMLANE', secretAccessKey: 'brass-and-birch' };

/** The SDK warns on the console of broken requests, which tests here provoke. */
const silent = () => undefined;

/** The official client, set up as the product sets it up. */
export function s3Client(port: number, config: S3ClientConfig = {}): S3Client {
  return new S3Client({
    endpoint: `http://127.0.0.1:${String(port)}`,
    region: REGION,
    credentials: CREDENTIALS,
    forcePathStyle: true,
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    maxAttempts: 1,
    logger: { debug: silent, info: silent, warn: silent, error: silent },
    ...config,
  });
}

export type StandIn = {
  readonly s3: S3Client;
  readonly port: number;
  /** Its folder, for looking at what is on disk. */
  readonly folder: string;
  /** Stops it; throws when it met a fault of its own. */
  readonly stop: () => Promise<void>;
};

/** A server in this process with an empty folder and one bucket. */
export async function startStandIn(options: Partial<FakeS3Options> = {}): Promise<StandIn> {
  const folder = throwawayFolder('fake-s3');
  const faults: unknown[] = [];
  const server = await startFakeS3({
    folder: folder.path,
    port: 0,
    bucket: BUCKET,
    region: REGION,
    ...CREDENTIALS,
    onFault: (error) => faults.push(error),
    ...options,
  });
  const s3 = s3Client(server.port);
  return {
    s3,
    port: server.port,
    folder: folder.path,
    stop: async () => {
      s3.destroy();
      await server.close();
      folder.remove();
      if (faults.length > 0) throw new AggregateError(faults, 'the server met faults of its own');
    },
  };
}

/** Bytes that differ from place to place, so that a wrong offset shows. */
export function bytesOf(length: number): Buffer {
  const block = createHash('sha512').update('shavings').digest();
  const bytes = Buffer.alloc(length, block);
  for (let at = 0; at + 4 <= length; at += 64) bytes.writeUInt32BE(at, at);
  return bytes;
}

/** What a refusal by the SDK looks like: its code and HTTP status. */
export function refusal(name: string, status: number): object {
  return { name, $metadata: { httpStatusCode: status } };
}
