import { afterAll } from 'vitest';
import { startFakeS3 } from '../../fake-s3/server.ts';
import { openStorage, type Storage } from '../../src/server/storage/storage.ts';
import { PUBLIC_URL, testServices, type TestServices } from './services.ts';
import { throwawayFolder } from './throwaway.ts';

// The SDK announces on stderr that it will want a newer Node one day; the product's settings silence it too.
process.env['AWS_SDK_JS_NODE_VERSION_SUPPORT_WARNING_DISABLED'] = 'true';

/** Services whose storage is a stand-in in this process. */
export interface StorageServices extends TestServices {
  readonly storage: Storage;
  /** Everything they keep on disk. */
  readonly folder: string;
}

/**
 * The product's services with a storage of this file's own. Call it once, at the top of the file.
 * @param settings such as WORKSHOP_QUOTA, in bytes
 */
export async function storageServices(
  settings: Partial<Pick<TestServices['settings'], 'WORKSHOP_QUOTA' | 'UPLOAD_MAX'>> = {},
): Promise<StorageServices> {
  const services = await testServices({ worker: true });
  const folder = throwawayFolder('storage');
  const keys = { accessKeyId: 'BENCH', secretAccessKey: 'vice-and-anvil' };
  const faults: unknown[] = [];
  const fake = await startFakeS3({
    folder: `${folder.path}/objects`,
    port: 0,
    region: 'us-east-1',
    bucket: 'centrepop',
    allowedOrigins: [PUBLIC_URL],
    onFault: (error) => faults.push(error),
    ...keys,
  });
  const endpoint = `http://127.0.0.1:${String(fake.port)}`;
  const complete = {
    ...services.settings,
    DATA_DIR: folder.path,
    S3_ENDPOINT: endpoint,
    S3_PUBLIC_ENDPOINT: endpoint,
    S3_ACCESS_KEY_ID: keys.accessKeyId,
    S3_SECRET_ACCESS_KEY: keys.secretAccessKey,
    ...settings,
  };
  const storage = openStorage(complete, services.log);
  afterAll(async () => {
    storage.close();
    await fake.close();
    folder.remove();
    if (faults.length > 0) throw new AggregateError(faults, 'the storage met faults of its own');
  });
  return { ...services, settings: complete, storage, folder: folder.path };
}
