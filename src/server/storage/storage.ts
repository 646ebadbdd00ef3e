import {
  CreateBucketCommand,
  HeadBucketCommand,
  PutBucketCorsCommand,
  type S3Client,
} from '@aws-sdk/client-s3';
import { type Logger } from 'pino';
import { type ServiceSettings } from '../env.ts';
import { isMissing, makeS3Client } from './s3-client.ts';
import { openObjects, type StorageObjects } from './storage-objects.ts';
import { openUploads, type StorageUploads } from './storage-uploads.ts';

/** Where files are kept. Keys are made by `keyOf` alone. */
export interface Storage extends StorageObjects {
  readonly uploads: StorageUploads;
  /** Makes the bucket unless it is there, and lets our pages send to it; where that is not ours to do, says so. */
  prepare(): Promise<void>;
  close(): void;
}

const QUICK_MS = 20_000;
const SLOW_MS = 10 * 60_000;

/** Opens the object storage; nothing is sent yet. */
export function openStorage(settings: ServiceSettings, log: Logger): Storage {
  const clients = {
    quick: makeS3Client(settings, settings.S3_ENDPOINT, QUICK_MS),
    slow: makeS3Client(settings, settings.S3_ENDPOINT, SLOW_MS),
    signer: makeS3Client(settings, settings.S3_PUBLIC_ENDPOINT, QUICK_MS),
  };
  const uploads = openUploads(clients, settings.S3_BUCKET);
  return {
    ...openObjects(clients, settings.S3_BUCKET, uploads),
    uploads,
    prepare: () => prepareBucket(clients.quick, settings, log),
    close: () => {
      for (const client of Object.values(clients)) client.destroy();
    },
  };
}

async function prepareBucket(client: S3Client, settings: ServiceSettings, log: Logger): Promise<void> {
  const Bucket = settings.S3_BUCKET;
  try {
    await client.send(new HeadBucketCommand({ Bucket }));
  } catch (error) {
    if (!isMissing(error)) throw error;
    await client.send(new CreateBucketCommand({ Bucket }));
  }
  try {
    await client.send(
      new PutBucketCorsCommand({
        Bucket,
        CORSConfiguration: {
          CORSRules: [
            {
              AllowedOrigins: [new URL(settings.PUBLIC_URL).origin],
              AllowedMethods: ['GET', 'HEAD', 'PUT'],
              AllowedHeaders: ['*'],
              // A page cannot complete an upload without reading the parts' tags.
              ExposeHeaders: ['ETag'],
              MaxAgeSeconds: 3600,
            },
          ],
        },
      }),
    );
  } catch (error) {
    // Some storages have it set by an administrator, and the stand-in has it in its own settings.
    log.info({ error: String(error) }, 'The storage keeps its own rules on which pages may send to it.');
  }
}

/** The part of keys below which uploads lie until the worker has accepted them. */
export const INCOMING = 'incoming/';

/** The key of what a browser uploads, before it is accepted. */
export function incomingKey(workshopId: string, fileId: string): string {
  return `${INCOMING}${workshopId}/${fileId}`;
}

/** The key of one kept form of a file; nothing of it comes from a person. */
export function keyOf(workshopId: string, fileId: string, variant: string): string {
  return `${workshopId}/${fileId}/${variant}`;
}
