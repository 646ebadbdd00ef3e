import { randomBytes } from 'node:crypto';
import { readdir, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { type ChecksumAlgorithm } from './checksums.ts';
import { type DataFiles } from './data-files.ts';
import { S3Error } from './errors.ts';
import { KeyedLock } from './keyed-lock.ts';
import { compareUtf8 } from './listing.ts';
import { type ObjectRecord, type ObjectStore } from './object-store.ts';
import { assembleParts, type CompletedPart, type PartRecord } from './part-list.ts';
import { ensureFolder, readRecords, syncFolder, writeRecord } from './record-files.ts';

/** What CreateMultipartUpload was told, kept for the finished object. */
export type UploadRecord = {
  readonly uploadId: string;
  readonly bucket: string;
  readonly key: string;
  /** ISO 8601. */
  readonly initiated: string;
  readonly headers: Readonly<Record<string, string>>;
  readonly algorithm?: ChecksumAlgorithm;
};

type Upload = {
  readonly record: UploadRecord;
  readonly folder: string;
  readonly parts: Map<number, PartRecord>;
};

/** Multipart uploads under way: on disk, and their records in memory. */
export class MultipartStore {
  readonly #root: string;
  readonly #data: DataFiles;
  readonly #objects: ObjectStore;
  readonly #uploads = new Map<string, Upload>();
  readonly #lock = new KeyedLock();

  private constructor(root: string, data: DataFiles, objects: ObjectStore) {
    this.#root = root;
    this.#data = data;
    this.#objects = objects;
  }

  /** Reads the uploads under `root`, dropping those that a crash left half begun or already completed. */
  static async open(root: string, data: DataFiles, objects: ObjectStore): Promise<MultipartStore> {
    const store = new MultipartStore(await ensureFolder(root, 'uploads'), data, objects);
    const completed = new Set([...objects.everyRecord()].map(({ uploadId }) => uploadId));
    for (const uploadId of await readdir(store.#root)) {
      const folder = join(store.#root, uploadId);
      const text = await readFile(join(folder, 'upload.json'), 'utf8').catch(() => undefined);
      if (text === undefined || completed.has(uploadId)) {
        await rm(folder, { recursive: true, force: true });
        continue;
      }
      const parts = await readRecords<PartRecord>(join(folder, 'parts'));
      store.#uploads.set(uploadId, {
        record: JSON.parse(text) as UploadRecord,
        folder,
        parts: new Map(parts.map((part) => [part.number, part])),
      });
    }
    return store;
  }

  async create(upload: Omit<UploadRecord, 'uploadId'>): Promise<UploadRecord> {
    const record = { ...upload, uploadId: randomBytes(24).toString('base64url') };
    const folder = join(this.#root, record.uploadId);
    await ensureFolder(folder, 'parts');
    await writeRecord(this.#data.tempFolder, join(folder, 'upload.json'), record);
    await syncFolder(this.#root);
    this.#uploads.set(record.uploadId, { record, folder, parts: new Map() });
    return record;
  }

  /** Throws NoSuchUpload, also when the upload is for another bucket or key. */
  get(bucket: string, key: string, uploadId: string): UploadRecord {
    return this.#upload(bucket, key, uploadId).record;
  }

  /** The parts so far, by number. Throws NoSuchUpload. */
  parts(bucket: string, key: string, uploadId: string): PartRecord[] {
    const { parts } = this.#upload(bucket, key, uploadId);
    return [...parts.values()].sort((a, b) => a.number - b.number);
  }

  /** The uploads of a bucket, by key and then by when they began. */
  list(bucket: string): UploadRecord[] {
    return [...this.#uploads.values()]
      .map(({ record }) => record)
      .filter((record) => record.bucket === bucket)
      .sort(
        (a, b) =>
          compareUtf8(a.key, b.key) ||
          compareUtf8(a.initiated, b.initiated) ||
          compareUtf8(a.uploadId, b.uploadId),
      );
  }

  /** Adds a part whose data is written, replacing one of the same number. Throws NoSuchUpload. */
  async putPart(target: UploadRecord, part: PartRecord): Promise<void> {
    await this.#lock.run(target.uploadId, async () => {
      const upload = this.#upload(target.bucket, target.key, target.uploadId);
      const replaced = upload.parts.get(part.number);
      await writeRecord(
        this.#data.tempFolder,
        join(upload.folder, 'parts', `${String(part.number)}.json`),
        part,
      );
      upload.parts.set(part.number, part);
      if (replaced) await this.#data.remove([replaced.segment]);
    });
  }

  /**
   * Publishes the object made of the listed parts; its data stays where the parts wrote it, so size does not
   * matter. Throws NoSuchUpload, InvalidPart, InvalidPartOrder, EntityTooSmall, and what `allow` throws: the
   * upload then goes on.
   */
  async complete(
    target: UploadRecord,
    listed: readonly CompletedPart[],
    modified: string,
    allow: (current: ObjectRecord | undefined) => void,
  ): Promise<ObjectRecord> {
    return this.#lock.run(target.uploadId, async () => {
      const upload = this.#upload(target.bucket, target.key, target.uploadId);
      const { key, headers, algorithm, uploadId } = upload.record;
      const assembled = assembleParts(upload.parts, listed, algorithm);
      const record: ObjectRecord = { key, modified, headers, uploadId, ...assembled };
      await this.#objects.publish(target.bucket, record, allow);
      await this.#drop(upload, new Set(record.segments.map(({ file }) => file)));
      return record;
    });
  }

  /** Forgets an upload and its parts. Throws NoSuchUpload. */
  async abort(target: UploadRecord): Promise<void> {
    await this.#lock.run(target.uploadId, async () => {
      await this.#drop(this.#upload(target.bucket, target.key, target.uploadId), new Set());
    });
  }

  /** Every part there is, for the sweep at start. */
  *everyPart(): Generator<PartRecord> {
    for (const { parts } of this.#uploads.values()) yield* parts.values();
  }

  async #drop(upload: Upload, keep: ReadonlySet<string>): Promise<void> {
    this.#uploads.delete(upload.record.uploadId);
    // The record goes first: from then on a start after a crash takes the rest for rubbish.
    await rm(join(upload.folder, 'upload.json'));
    await rm(upload.folder, { recursive: true, force: true });
    const segments = [...upload.parts.values()].map(({ segment }) => segment);
    await this.#data.remove(segments.filter(({ file }) => !keep.has(file)));
  }

  #upload(bucket: string, key: string, uploadId: string): Upload {
    const upload = this.#uploads.get(uploadId);
    if (upload?.record.bucket === bucket && upload.record.key === key) return upload;
    throw new S3Error(
      'NoSuchUpload',
      'The specified upload does not exist. The upload ID may be invalid, or the upload may have been aborted or completed.',
      { UploadId: uploadId },
    );
  }
}
