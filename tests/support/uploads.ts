import { createHash } from 'node:crypto';
import { eq } from 'drizzle-orm';
import { newId } from '../../src/db/columns.ts';
import { builds, buildSlugs } from '../../src/db/schema/builds.ts';
import { files, fileVariants } from '../../src/db/schema/files.ts';
import { type FilePurpose } from '../../src/domain/file-kinds.ts';
import { partCountFor, partBytesFor } from '../../src/features/files/file.ts';
import { acceptFile } from '../../src/features/files/server/accept-file.ts';
import { acceptMedia } from '../../src/features/files/server/accept-media.ts';
import { completeUpload } from '../../src/features/files/server/complete-upload.ts';
import { signParts } from '../../src/features/files/server/sign-parts.ts';
import { startUpload } from '../../src/features/files/server/start-upload.ts';
import { type WorkshopContext } from '../../src/server/context.ts';
import { type Services } from '../../src/server/services.ts';

/** A build put straight into the database. */
export async function aBuild(
  services: Services,
  workshopId: string,
  build: { readonly slug?: string; readonly visibility?: 'private' | 'public' } = {},
): Promise<{ id: string; slug: string }> {
  const { slug = 'press', visibility = 'private' } = build;
  const id = newId();
  await services.db.insert(builds).values({ id, workshopId, name: 'Orchard press', visibility });
  await services.db.insert(buildSlugs).values({ workshopId, slug, buildId: id, current: true });
  return { id, slug };
}

/** What announces some bytes as a file. */
export function announcementOf(
  bytes: Uint8Array,
  name: string,
  build: string,
  purpose: FilePurpose = 'footage',
) {
  const fingerprint = createHash('sha256').update(bytes).digest('hex');
  return { name, bytes: bytes.length, purpose, fingerprint, build };
}

/** Sends some of the parts of an upload, as a browser does. */
export async function sendParts(
  context: WorkshopContext,
  address: { readonly build: string; readonly file: string },
  bytes: Uint8Array,
  numbers: readonly number[],
): Promise<Response[]> {
  const { parts } = await signParts(context, { ...address, numbers });
  const size = partBytesFor(bytes.length);
  return Promise.all(
    parts.map(({ number, url }) =>
      fetch(url, { method: 'PUT', body: Buffer.from(bytes.subarray((number - 1) * size, number * size)) }),
    ),
  );
}

/** Uploads a file as a browser does, up to handing it to the worker. */
export async function upload(
  context: WorkshopContext,
  build: string,
  name: string,
  bytes: Uint8Array,
  purpose: FilePurpose = 'footage',
): Promise<string> {
  const { id } = await startUpload(context, announcementOf(bytes, name, build, purpose));
  const numbers = Array.from({ length: partCountFor(bytes.length) }, (_none, index) => index + 1);
  await sendParts(context, { build, file: id }, bytes, numbers);
  await completeUpload(context, { build, file: id });
  return id;
}

/** Lets the worker's two jobs look at a file, one after the other. */
export async function check(services: Services, fileId: string) {
  await acceptFile(services, { fileId });
  if ((await rowOf(services, fileId)).state === 'checking') await acceptMedia(services, { fileId });
  const file = await rowOf(services, fileId);
  const rows = await services.db.select().from(fileVariants).where(eq(fileVariants.fileId, fileId));
  return { file, variants: Object.fromEntries(rows.map((row) => [row.variant, row])) };
}

/** Uploads a file and lets the worker look at it. */
export async function uploadAndCheck(
  context: WorkshopContext,
  build: string,
  name: string,
  bytes: Uint8Array,
  purpose: FilePurpose = 'footage',
) {
  return check(context.services, await upload(context, build, name, bytes, purpose));
}

export async function rowOf(services: Services, fileId: string) {
  const [row] = await services.db.select().from(files).where(eq(files.id, fileId));
  if (!row) throw new Error(`There is no file ${fileId}.`);
  return row;
}
