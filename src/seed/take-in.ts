import { createHash } from 'node:crypto';
import { readFile } from 'node:fs/promises';
import { type FilePurpose } from '../domain/file-kinds.ts';
import { partBytesFor, partCountFor } from '../features/files/file.ts';
import { acceptFileJob, acceptMediaJob } from '../features/files/jobs.ts';
import { completeUpload } from '../features/files/server/complete-upload.ts';
import { listFiles } from '../features/files/server/list-files.ts';
import { signParts } from '../features/files/server/sign-parts.ts';
import { startUpload } from '../features/files/server/start-upload.ts';
import { type Context } from '../server/context.ts';

const MEDIA = new URL('./media/', import.meta.url);

/** The bytes of a file of the demo. */
export function readMedia(name: string): Promise<Buffer> {
  return readFile(new URL(name, MEDIA));
}

interface DemoFile {
  readonly name: string;
  readonly purpose: FilePurpose;
}

/**
 * Brings files of the demo in as a browser does, and looks at them as the worker does: at the first start the demo
 * is made before the worker is there.
 * @returns their ids, by name
 * @throws Error when one was not accepted
 */
export async function takeIn(
  context: Context,
  build: string,
  demoFiles: readonly DemoFile[],
): Promise<ReadonlyMap<string, string>> {
  const ids = new Map<string, string>();
  for (const file of demoFiles) ids.set(file.name, await send(context, build, file));
  // Photos are looked at while films, one at a time, are.
  await Promise.all([...ids.values()].map((fileId) => accept(context, fileId)));
  const { items } = await listFiles(context, { build });
  for (const [name, id] of ids) {
    const file = items.find((item) => item.id === id);
    if (file?.state !== 'ready')
      throw new Error(`${name} was not accepted: ${file?.failure ?? 'it is not ready'}`);
  }
  return ids;
}

async function send(context: Context, build: string, { name, purpose }: DemoFile): Promise<string> {
  const bytes = await readMedia(name);
  const fingerprint = createHash('sha256').update(bytes).digest('hex');
  const { id } = await startUpload(context, { build, name, bytes: bytes.length, purpose, fingerprint });
  const numbers = Array.from({ length: partCountFor(bytes.length) }, (_none, index) => index + 1);
  const { parts } = await signParts(context, { build, file: id, numbers });
  const size = partBytesFor(bytes.length);
  for (const { number, url } of parts) {
    const body = new Uint8Array(bytes.subarray((number - 1) * size, number * size));
    const { ok, status } = await fetch(url, { method: 'PUT', body });
    if (!ok) throw new Error(`The storage answered ${String(status)} to ${name}.`);
  }
  await completeUpload(context, { build, file: id });
  return id;
}

async function accept({ services }: Context, fileId: string): Promise<void> {
  for (const job of [acceptFileJob, acceptMediaJob]) await (await job.load())(services, { fileId });
}
