import { type FileHandle, open } from 'node:fs/promises';
import { type StoredPart } from './storage-uploads.ts';
import { type Storage } from './storage.ts';

const READ_STRETCH = 64 * 1024 * 1024;
const WRITE_PART = 16 * 1024 * 1024;
const TRIES = 3;

/**
 * Brings an object into a local file, stretch by stretch: a lost connection costs one of them.
 * @param bytes its size
 */
export async function fetchToFile(storage: Storage, key: string, bytes: number, path: string): Promise<void> {
  const file = await open(path, 'w', 0o600);
  try {
    for (let first = 0; first < bytes; first += READ_STRETCH) {
      const last = Math.min(first + READ_STRETCH, bytes) - 1;
      await tryAgain(() => fetchStretch(storage, key, file, { first, last }));
    }
  } finally {
    await file.close();
  }
}

async function fetchStretch(
  storage: Storage,
  key: string,
  file: FileHandle,
  range: { readonly first: number; readonly last: number },
): Promise<void> {
  let at = range.first;
  for await (const chunk of await storage.read(key, range)) {
    const bytes = chunk as Buffer;
    await file.writev([bytes], at);
    at += bytes.length;
  }
  if (at !== range.last + 1) throw new Error('The storage gave less than it has.');
}

/**
 * Puts a local file into the storage, in parts.
 * @returns its size in bytes
 */
export async function putFile(
  storage: Storage,
  key: string,
  contentType: string,
  path: string,
): Promise<number> {
  const file = await open(path, 'r');
  try {
    const { size } = await file.stat();
    if (size <= WRITE_PART) {
      await storage.put(key, contentType, await readStretch(file, 0, size));
      return size;
    }
    await putInParts(storage, key, contentType, file, size);
    return size;
  } finally {
    await file.close();
  }
}

async function putInParts(
  { uploads }: Storage,
  key: string,
  contentType: string,
  file: FileHandle,
  size: number,
): Promise<void> {
  const uploadId = await uploads.begin(key, contentType);
  try {
    const parts: StoredPart[] = [];
    for (let at = 0; at < size; at += WRITE_PART) {
      const bytes = await readStretch(file, at, Math.min(WRITE_PART, size - at));
      parts.push(await uploads.put(key, uploadId, parts.length + 1, bytes));
    }
    await uploads.complete(key, uploadId, parts);
  } catch (error) {
    await uploads.abort(key, uploadId);
    throw error;
  }
}

async function readStretch(file: FileHandle, at: number, length: number): Promise<Buffer> {
  const buffer = Buffer.alloc(length);
  let filled = 0;
  while (filled < length) {
    const { bytesRead } = await file.read(buffer, filled, length - filled, at + filled);
    if (bytesRead === 0) throw new Error('A local file became shorter while it was read.');
    filled += bytesRead;
  }
  return buffer;
}

async function tryAgain(step: () => Promise<void>): Promise<void> {
  for (let left = TRIES; ; left -= 1) {
    try {
      await step();
      return;
    } catch (error) {
      if (left <= 1) throw error;
    }
  }
}
