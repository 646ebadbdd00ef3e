import { eq, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { type Services } from '../../../server/services.ts';
import { putFile } from '../../../server/storage/local-copy.ts';
import { incomingKey, keyOf } from '../../../server/storage/storage.ts';
import { type Variant } from '../file.ts';
import { type Probe } from '../probe.ts';
import { type CheckedFile } from './check-file.ts';

/** A kept form, made: in memory or in a file. */
export interface MadeVariant {
  readonly variant: Variant;
  readonly contentType: string;
  readonly bytes?: Uint8Array;
  readonly path?: string;
  readonly width?: number;
  readonly height?: number;
  readonly frames?: number;
}

/** What becomes known of a file when it is accepted. */
export type AcceptedAs = Pick<typeof files.$inferInsert, 'kind' | 'contentType'> &
  Partial<Pick<typeof files.$inferInsert, 'width' | 'height' | 'durationFrames' | 'rateNum' | 'rateDen'>> & {
    readonly probe: Probe;
  };

/** Puts made forms into the storage and lists them with the file; the same form again replaces itself. */
export async function keepVariants(
  { db, storage }: Services,
  file: CheckedFile,
  made: readonly MadeVariant[],
): Promise<void> {
  for (const one of made) {
    const key = keyOf(file.workshopId, file.id, one.variant);
    let size = one.bytes?.byteLength ?? 0;
    if (one.path !== undefined) size = await putFile(storage, key, one.contentType, one.path);
    else await storage.put(key, one.contentType, one.bytes ?? new Uint8Array());
    await listVariant(db, file, one, size);
  }
  await db.update(files).set({ updatedAt: new Date() }).where(eq(files.id, file.id));
}

async function listVariant(db: Database, file: CheckedFile, made: MadeVariant, bytes: number): Promise<void> {
  const { variant, contentType, width = null, height = null, frames = null } = made;
  const measures = { contentType, bytes, width, height, frames };
  await db
    .insert(fileVariants)
    .values({ workshopId: file.workshopId, fileId: file.id, variant, ...measures })
    .onConflictDoUpdate({ target: [fileVariants.fileId, fileVariants.variant], set: measures });
}

/** Takes a file in: its original moves to where files are kept, and from now on it is there for its team. */
export async function acceptAs(services: Services, file: CheckedFile, as: AcceptedAs): Promise<void> {
  const { db, storage, jobs } = services;
  const incoming = incomingKey(file.workshopId, file.id);
  const contentType = as.contentType ?? 'application/octet-stream';
  await storage.copy(incoming, keyOf(file.workshopId, file.id, 'original'), contentType, file.bytes);
  await db.transaction(async (transaction) => {
    await listVariant(transaction, file, { variant: 'original', contentType }, file.bytes);
    await transaction
      .update(files)
      .set({ ...as, state: 'ready', progress: null, failure: null, updatedAt: sql`clock_timestamp()` })
      .where(eq(files.id, file.id));
    await jobs.enqueue(transaction, 'file-ready', { fileId: file.id });
  });
  await storage.remove(incoming);
}
