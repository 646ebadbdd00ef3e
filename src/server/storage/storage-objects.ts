import {
  CopyObjectCommand,
  DeleteObjectCommand,
  DeleteObjectsCommand,
  GetObjectCommand,
  HeadObjectCommand,
  paginateListObjectsV2,
  PutObjectCommand,
  type S3Client,
  UploadPartCopyCommand,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { type Readable } from 'node:stream';
import { isMissing } from './s3-client.ts';
import { type StoredPart, type StorageUploads } from './storage-uploads.ts';

/** The first and the last byte of a stretch, both included. */
export interface ByteRange {
  readonly first: number;
  readonly last: number;
}

export interface StorageObjects {
  /** Size in bytes; null when there is no such object. */
  sizeOf(key: string): Promise<number | null>;
  /** Its bytes as they come, or a stretch of them. @throws when it is not there */
  read(key: string, range?: ByteRange, signal?: AbortSignal): Promise<Readable>;
  put(key: string, contentType: string, bytes: Uint8Array): Promise<void>;
  /** Copies inside the storage, however large. */
  copy(from: string, to: string, contentType: string, bytes: number): Promise<void>;
  remove(key: string): Promise<void>;
  /** Removes everything whose key begins so. */
  removeAll(prefix: string): Promise<void>;
  /**
   * An address for a browser to read the object at, the same for everyone who asks within the hour.
   * @param fileName makes the browser save it under that name
   */
  signRead(key: string, contentType: string, now: Date, fileName?: string): Promise<string>;
}

/** For how long an address to read from holds, in seconds, counted from the full hour. */
export const READ_SIGNED_SECONDS = 12 * 3600;

const HOUR_MS = 3_600_000;
/** One copy takes at most 5 GB by the protocol; parts of this size are well below, and answered in time. */
const COPY_PART = 512 * 1024 * 1024;

export function openObjects(
  clients: { readonly quick: S3Client; readonly slow: S3Client; readonly signer: S3Client },
  Bucket: string,
  uploads: StorageUploads,
): StorageObjects {
  const { quick, slow, signer } = clients;

  async function copyInParts(from: string, to: string, contentType: string, bytes: number): Promise<void> {
    const uploadId = await uploads.begin(to, contentType);
    try {
      const parts: StoredPart[] = [];
      for (let first = 0; first < bytes; first += COPY_PART) {
        const last = Math.min(first + COPY_PART, bytes) - 1;
        const number = parts.length + 1;
        const { CopyPartResult } = await slow.send(
          new UploadPartCopyCommand({
            Bucket,
            Key: to,
            UploadId: uploadId,
            PartNumber: number,
            CopySource: `${Bucket}/${from}`,
            CopySourceRange: `bytes=${String(first)}-${String(last)}`,
          }),
        );
        parts.push({ number, bytes: last - first + 1, etag: CopyPartResult?.ETag ?? '' });
      }
      await uploads.complete(to, uploadId, parts);
    } catch (error) {
      await uploads.abort(to, uploadId);
      throw error;
    }
  }

  return {
    async sizeOf(Key) {
      try {
        const { ContentLength } = await quick.send(new HeadObjectCommand({ Bucket, Key }));
        return ContentLength ?? 0;
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
    },
    async read(Key, range, abortSignal) {
      const Range = range && `bytes=${String(range.first)}-${String(range.last)}`;
      const { Body } = await quick.send(
        new GetObjectCommand({ Bucket, Key, ...(Range !== undefined && { Range }) }),
        abortSignal && { abortSignal },
      );
      return Body as Readable;
    },
    async put(Key, ContentType, Body) {
      await slow.send(
        new PutObjectCommand({ Bucket, Key, ContentType, Body, ContentLength: Body.byteLength }),
      );
    },
    async copy(from, to, contentType, bytes) {
      if (bytes > COPY_PART) return copyInParts(from, to, contentType, bytes);
      await slow.send(
        new CopyObjectCommand({
          Bucket,
          Key: to,
          CopySource: `${Bucket}/${from}`,
          ContentType: contentType,
          MetadataDirective: 'REPLACE',
        }),
      );
    },
    async remove(Key) {
      await quick.send(new DeleteObjectCommand({ Bucket, Key }));
    },
    async removeAll(Prefix) {
      for await (const page of paginateListObjectsV2({ client: quick }, { Bucket, Prefix })) {
        const Objects = (page.Contents ?? []).flatMap(({ Key }) => (Key === undefined ? [] : [{ Key }]));
        if (Objects.length > 0)
          await quick.send(new DeleteObjectsCommand({ Bucket, Delete: { Objects, Quiet: true } }));
      }
    },
    signRead(Key, ResponseContentType, now, fileName) {
      const ResponseContentDisposition = fileName === undefined ? undefined : attachment(fileName);
      return getSignedUrl(
        signer,
        new GetObjectCommand({ Bucket, Key, ResponseContentType, ResponseContentDisposition }),
        {
          expiresIn: READ_SIGNED_SECONDS,
          signingDate: new Date(Math.floor(now.getTime() / HOUR_MS) * HOUR_MS),
        },
      );
    },
  };
}

/** Content-Disposition that saves under a person's own name for the file (RFC 6266). */
export function attachment(fileName: string): string {
  const plain = fileName.replace(/[^\x20-\x7e]|["\\%]/g, '_');
  const encoded = encodeURIComponent(fileName).replace(
    /['()*]/g,
    (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`,
  );
  return `attachment; filename="${plain}"; filename*=UTF-8''${encoded}`;
}
