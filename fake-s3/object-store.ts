import { createHash } from 'node:crypto';
import { readdir, readFile, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { type Checksum } from './checksums.ts';
import { type DataFiles, type Segment } from './data-files.ts';
import { S3Error } from './errors.ts';
import { KeyedLock } from './keyed-lock.ts';
import { compareUtf8 } from './listing.ts';
import { ensureFolder, readRecords, syncFolder, writeRecord } from './record-files.ts';

/** An object as its record file holds it. Renaming that one file into place is what publishes it. */
export type ObjectRecord = {
  readonly key: string;
  /** Bytes. */
  readonly size: number;
  /** Without quotes: MD5 in hex, or that of the parts' MD5s followed by `-parts`. */
  readonly etag: string;
  /** ISO 8601 with milliseconds. */
  readonly modified: string;
  /** Headers kept for GET and HEAD, x-amz-meta-* included; names in lower case. */
  readonly headers: Readonly<Record<string, string>>;
  readonly checksum?: Checksum;
  readonly segments: readonly Segment[];
  /** The multipart upload it came from: completing that one again answers alike. */
  readonly uploadId?: string;
};

type Bucket = {
  readonly created: string;
  readonly folder: string;
  readonly objects: Map<string, ObjectRecord>;
  /** Keys in the order of a listing; undefined while out of date. */
  sortedKeys: readonly string[] | undefined;
};

/** Buckets and the records of their objects: on disk, and all in memory. */
export class ObjectStore {
  readonly #root: string;
  readonly #data: DataFiles;
  readonly #buckets = new Map<string, Bucket>();
  readonly #lock = new KeyedLock();

  private constructor(root: string, data: DataFiles) {
    this.#root = root;
    this.#data = data;
  }

  /** Reads all records under `root`. */
  static async open(root: string, data: DataFiles): Promise<ObjectStore> {
    const store = new ObjectStore(await ensureFolder(root, 'buckets'), data);
    for (const name of await readdir(store.#root)) {
      const folder = join(store.#root, name);
      const created = await readFile(join(folder, 'bucket.json'), 'utf8').catch(() => undefined);
      // A bucket whose making or removal was interrupted has no record and so does not exist.
      if (created === undefined) continue;
      const records = await readRecords<ObjectRecord>(join(folder, 'objects'));
      store.#buckets.set(name, {
        created: (JSON.parse(created) as { created: string }).created,
        folder,
        objects: new Map(records.map((record) => [record.key, record])),
        sortedKeys: undefined,
      });
    }
    return store;
  }

  /** Names and instants of creation, by name. */
  listBuckets(): { name: string; created: string }[] {
    return [...this.#buckets]
      .map(([name, { created }]) => ({ name, created }))
      .sort((a, b) => compareUtf8(a.name, b.name));
  }

  hasBucket(name: string): boolean {
    return this.#buckets.has(name);
  }

  /** Makes a bucket. Throws InvalidBucketName, BucketAlreadyOwnedByYou. */
  async createBucket(name: string, created: string): Promise<void> {
    if (!/^[a-z0-9][a-z0-9.-]{1,61}[a-z0-9]$/.test(name) || name.includes('..')) {
      throw new S3Error('InvalidBucketName', 'The specified bucket is not valid.', { BucketName: name });
    }
    await this.#lock.run(name, async () => {
      if (this.hasBucket(name)) {
        throw new S3Error(
          'BucketAlreadyOwnedByYou',
          'Your previous request to create the named bucket succeeded and you already own it.',
          { BucketName: name },
        );
      }
      const folder = join(this.#root, name);
      await ensureFolder(folder, 'objects');
      await writeRecord(this.#data.tempFolder, join(folder, 'bucket.json'), { created });
      await syncFolder(this.#root);
      this.#buckets.set(name, { created, folder, objects: new Map(), sortedKeys: undefined });
    });
  }

  /** Removes an empty bucket. Throws NoSuchBucket, BucketNotEmpty. */
  async deleteBucket(name: string): Promise<void> {
    const bucket = this.#bucket(name);
    if (bucket.objects.size > 0) {
      throw new S3Error('BucketNotEmpty', 'The bucket you tried to delete is not empty', {
        BucketName: name,
      });
    }
    this.#buckets.delete(name);
    await rm(join(bucket.folder, 'bucket.json'));
    await rm(bucket.folder, { recursive: true, force: true });
  }

  /** All keys in the order of their UTF-8 bytes. Throws NoSuchBucket. */
  keys(bucketName: string): readonly string[] {
    const bucket = this.#bucket(bucketName);
    bucket.sortedKeys ??= [...bucket.objects.keys()].sort(compareUtf8);
    return bucket.sortedKeys;
  }

  find(bucketName: string, key: string): ObjectRecord | undefined {
    return this.#bucket(bucketName).objects.get(key);
  }

  /** Throws NoSuchBucket, NoSuchKey. */
  get(bucketName: string, key: string): ObjectRecord {
    const record = this.find(bucketName, key);
    if (!record) throw new S3Error('NoSuchKey', 'The specified key does not exist.', { Key: key });
    return record;
  }

  /**
   * Makes a record the object under its key, replacing what was there. `allow` sees the object about to be
   * replaced, with nobody able to change it meanwhile, and refuses by throwing.
   */
  async publish(
    bucketName: string,
    record: ObjectRecord,
    allow: (current: ObjectRecord | undefined) => void,
  ): Promise<void> {
    await this.#lock.run(`${bucketName}/${record.key}`, async () => {
      const bucket = this.#bucket(bucketName);
      const current = bucket.objects.get(record.key);
      allow(current);
      await writeRecord(this.#data.tempFolder, recordPath(bucket, record.key), record);
      bucket.objects.set(record.key, record);
      if (!current) bucket.sortedKeys = undefined;
      else await this.#data.remove(current.segments);
    });
  }

  /** Removes an object; one that is not there is none the less removed. `allow` as in `publish`. */
  async remove(
    bucketName: string,
    key: string,
    allow: (current: ObjectRecord | undefined) => void,
  ): Promise<void> {
    await this.#lock.run(`${bucketName}/${key}`, async () => {
      const bucket = this.#bucket(bucketName);
      const current = bucket.objects.get(key);
      allow(current);
      if (!current) return;
      await rm(recordPath(bucket, key), { force: true });
      await syncFolder(join(bucket.folder, 'objects'));
      bucket.objects.delete(key);
      bucket.sortedKeys = undefined;
      await this.#data.remove(current.segments);
    });
  }

  /** Every record there is, for the sweep at start. */
  *everyRecord(): Generator<ObjectRecord> {
    for (const bucket of this.#buckets.values()) yield* bucket.objects.values();
  }

  #bucket(name: string): Bucket {
    const bucket = this.#buckets.get(name);
    if (!bucket) {
      throw new S3Error('NoSuchBucket', 'The specified bucket does not exist', { BucketName: name });
    }
    return bucket;
  }
}

/** A key never becomes part of a path: its hash does, so any key of any length is safe. */
function recordPath(bucket: Bucket, key: string): string {
  return join(bucket.folder, 'objects', `${createHash('sha256').update(key).digest('hex')}.json`);
}
