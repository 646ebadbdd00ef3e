import { S3Client } from '@aws-sdk/client-s3';
import { type ServiceSettings } from '../env.ts';

export type StorageSettings = Pick<
  ServiceSettings,
  | 'S3_ENDPOINT'
  | 'S3_PUBLIC_ENDPOINT'
  | 'S3_REGION'
  | 'S3_BUCKET'
  | 'S3_ACCESS_KEY_ID'
  | 'S3_SECRET_ACCESS_KEY'
>;

const CONNECT_MS = 5_000;

/**
 * A client for one endpoint of the object storage.
 * @param answerMs how long an answer may take to begin
 */
export function makeS3Client(settings: StorageSettings, endpoint: string, answerMs: number): S3Client {
  return new S3Client({
    endpoint,
    region: settings.S3_REGION,
    credentials: {
      accessKeyId: settings.S3_ACCESS_KEY_ID,
      secretAccessKey: settings.S3_SECRET_ACCESS_KEY,
    },
    forcePathStyle: true,
    // Otherwise the client adds checksums that not every storage of this protocol knows.
    requestChecksumCalculation: 'WHEN_REQUIRED',
    responseChecksumValidation: 'WHEN_REQUIRED',
    // Without the last line a storage that never answers is only warned about.
    requestHandler: {
      connectionTimeout: CONNECT_MS,
      requestTimeout: answerMs,
      throwOnRequestTimeout: true,
    },
  });
}

/** Whether the storage says that there is no such object, upload or bucket. */
export function isMissing(error: unknown): boolean {
  if (!(error instanceof Error)) return false;
  const { $metadata: metadata } = error as { $metadata?: { httpStatusCode?: number } };
  return (
    ['NoSuchKey', 'NoSuchUpload', 'NoSuchBucket', 'NotFound'].includes(error.name) ||
    metadata?.httpStatusCode === 404
  );
}
