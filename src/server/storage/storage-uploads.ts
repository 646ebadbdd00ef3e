import {
  AbortMultipartUploadCommand,
  CompleteMultipartUploadCommand,
  CreateMultipartUploadCommand,
  ListMultipartUploadsCommand,
  paginateListParts,
  type S3Client,
  UploadPartCommand,
} from '@aws-sdk/client-s3';
import { getSignedUrl } from '@aws-sdk/s3-request-presigner';
import { isMissing } from './s3-client.ts';

/** A part that the storage has. */
export interface StoredPart {
  readonly number: number;
  readonly bytes: number;
  readonly etag: string;
}

/** Uploads in parts that browsers send themselves. */
export interface StorageUploads {
  /** @returns the storage's id of it */
  begin(key: string, contentType: string): Promise<string>;
  /** An address to PUT one part to: for exactly so many bytes, for one hour. */
  signPart(key: string, uploadId: string, number: number, bytes: number): Promise<string>;
  /** Sends a part from here. */
  put(key: string, uploadId: string, number: number, bytes: Uint8Array): Promise<StoredPart>;
  /** The parts that are there, in order; null when there is no such upload any more. */
  listParts(key: string, uploadId: string): Promise<readonly StoredPart[] | null>;
  complete(key: string, uploadId: string, parts: readonly StoredPart[]): Promise<void>;
  /** One that is gone already is no error. */
  abort(key: string, uploadId: string): Promise<void>;
  /** Everything begun and neither completed nor aborted below a prefix. */
  listUnfinished(prefix: string): Promise<readonly { key: string; uploadId: string; begun: Date }[]>;
}

/** For how long a browser may use the address of a part, in seconds. */
export const PART_SIGNED_SECONDS = 3600;

/**
 * @param quick for what is answered at once
 * @param slow for completing, which puts many parts together
 * @param signer signs for the endpoint that browsers use; it sends nothing
 */
export function openUploads(
  clients: { readonly quick: S3Client; readonly slow: S3Client; readonly signer: S3Client },
  Bucket: string,
): StorageUploads {
  const { quick, slow, signer } = clients;
  return {
    async begin(Key, ContentType) {
      const { UploadId } = await quick.send(new CreateMultipartUploadCommand({ Bucket, Key, ContentType }));
      if (UploadId === undefined) throw new Error('The storage began an upload without naming it.');
      return UploadId;
    },
    signPart: (Key, UploadId, PartNumber, ContentLength) =>
      getSignedUrl(signer, new UploadPartCommand({ Bucket, Key, UploadId, PartNumber, ContentLength }), {
        expiresIn: PART_SIGNED_SECONDS,
        // A longer or shorter part than was announced is then refused by the storage itself.
        signableHeaders: new Set(['host', 'content-length']),
      }),
    async put(Key, UploadId, PartNumber, Body) {
      const ContentLength = Body.byteLength;
      const { ETag } = await slow.send(
        new UploadPartCommand({ Bucket, Key, UploadId, PartNumber, Body, ContentLength }),
      );
      return { number: PartNumber, bytes: ContentLength, etag: ETag ?? '' };
    },
    async listParts(Key, UploadId) {
      const parts: StoredPart[] = [];
      try {
        for await (const page of paginateListParts({ client: quick }, { Bucket, Key, UploadId })) {
          for (const { PartNumber, Size, ETag } of page.Parts ?? []) {
            parts.push({ number: PartNumber ?? 0, bytes: Size ?? 0, etag: ETag ?? '' });
          }
        }
      } catch (error) {
        if (isMissing(error)) return null;
        throw error;
      }
      return parts;
    },
    async complete(Key, UploadId, parts) {
      await slow.send(
        new CompleteMultipartUploadCommand({
          Bucket,
          Key,
          UploadId,
          MultipartUpload: { Parts: parts.map(({ number, etag }) => ({ PartNumber: number, ETag: etag })) },
        }),
      );
    },
    async abort(Key, UploadId) {
      try {
        await quick.send(new AbortMultipartUploadCommand({ Bucket, Key, UploadId }));
      } catch (error) {
        if (!isMissing(error)) throw error;
      }
    },
    async listUnfinished(Prefix) {
      const found: { key: string; uploadId: string; begun: Date }[] = [];
      let after: { KeyMarker?: string; UploadIdMarker?: string } = {};
      for (;;) {
        const page = await quick.send(new ListMultipartUploadsCommand({ Bucket, Prefix, ...after }));
        for (const { Key, UploadId, Initiated } of page.Uploads ?? []) {
          if (Key !== undefined && UploadId !== undefined && Initiated !== undefined)
            found.push({ key: Key, uploadId: UploadId, begun: Initiated });
        }
        if (page.IsTruncated !== true || page.NextKeyMarker === undefined) break;
        after = {
          KeyMarker: page.NextKeyMarker,
          ...(page.NextUploadIdMarker !== undefined && { UploadIdMarker: page.NextUploadIdMarker }),
        };
      }
      return found;
    },
  };
}
