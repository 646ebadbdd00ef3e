import { randomUUID } from 'node:crypto';
import { mkdir, open, readdir, readFile, rename, rm } from 'node:fs/promises';
import { dirname, join } from 'node:path';

/**
 * Writes a value as a JSON file so that a reader, or a start after a crash, finds the old one or the new one
 * and never half of it: written and synced under `tempFolder`, then renamed over `path`.
 */
export async function writeRecord(tempFolder: string, path: string, value: unknown): Promise<void> {
  const temporary = join(tempFolder, `${randomUUID()}.json`);
  try {
    const file = await open(temporary, 'wx');
    try {
      await file.writeFile(JSON.stringify(value));
      await file.sync();
    } finally {
      await file.close();
    }
    await rename(temporary, path);
  } catch (error) {
    await rm(temporary, { force: true });
    throw error;
  }
  await syncFolder(dirname(path));
}

/** The values of all JSON files of a folder, in no particular order. */
export async function readRecords<T>(folder: string): Promise<T[]> {
  const records: T[] = [];
  for (const name of await readdir(folder)) {
    if (name.endsWith('.json')) records.push(JSON.parse(await readFile(join(folder, name), 'utf8')) as T);
  }
  return records;
}

/** Makes a folder, parents included, and gives back its path. */
export async function ensureFolder(...path: string[]): Promise<string> {
  const folder = join(...path);
  await mkdir(folder, { recursive: true });
  return folder;
}

/** Makes renames inside a folder survive a power cut. */
export async function syncFolder(folder: string): Promise<void> {
  const handle = await open(folder, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}
