import { eq } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { Invalid, NotFound } from '../../../server/errors.ts';
import { incomingKey, type Storage } from '../../../server/storage/storage.ts';
import { verb } from '../../../server/verb.ts';
import { partCountFor, partLength } from '../file.ts';
import { type FileAddress, loadFile } from './load-file.ts';

/**
 * Puts the parts of an upload together and hands it to the worker. Asked again for one that is complete, it says
 * the same again.
 * @throws Invalid when the parts that are there do not add up to the announced size
 */
export const completeUpload = verb({ may: 'footage.change' }, async (context, input: FileAddress) => {
  const { db, workshop, now, services } = context;
  const file = await loadFile(context, input, { lock: true });
  if (file.state === 'checking' || file.state === 'ready') return { id: file.id };
  if (file.uploadId === null) throw new NotFound('This upload');
  await putTogether(services.storage, incomingKey(workshop.id, file.id), file.uploadId, file.bytes);
  await db
    .update(files)
    .set({ state: 'checking', uploadId: null, updatedAt: now })
    .where(eq(files.id, file.id));
  await services.jobs.enqueue(db, 'upload-completed', { fileId: file.id });
  return { id: file.id };
});

async function putTogether(storage: Storage, key: string, uploadId: string, bytes: number): Promise<void> {
  const parts = await storage.uploads.listParts(key, uploadId);
  if (parts === null) {
    // Put together by an earlier request whose answer, or whose transaction, was lost.
    if ((await storage.sizeOf(key)) === bytes) return;
    throw new NotFound('This upload was given up. It');
  }
  const isWhole =
    parts.length === partCountFor(bytes) &&
    parts.every(
      ({ number, bytes: there }, index) => number === index + 1 && there === partLength(bytes, number),
    );
  if (!isWhole) {
    throw new Invalid({
      '': 'Some of the file is not here yet. What was sent is kept; choose the file again to send the rest.',
    });
  }
  await storage.uploads.complete(key, uploadId, parts);
}
