import { and, eq, isNull } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** What names a file: its build in the address, and its id. */
export interface FileAddress {
  readonly build: string;
  readonly file: string;
}

/**
 * A file of the workshop's build.
 * @param options.lock holds it against every other write to it until the transaction ends
 * @throws NotFound
 */
export async function loadFile(
  context: WorkshopContext,
  { build: slug, file: id }: FileAddress,
  options: { readonly lock?: boolean; readonly deleted?: boolean } = {},
) {
  const build = await loadBuild(context, slug);
  const query = context.db
    .select()
    .from(files)
    .where(
      and(
        eq(files.id, id),
        eq(files.workshopId, context.workshop.id),
        eq(files.buildId, build.id),
        options.deleted === true ? undefined : isNull(files.deletedAt),
      ),
    );
  const [row] = options.lock === true ? await query.for('update') : await query;
  if (!row) throw new NotFound('This file');
  return row;
}

/**
 * A file whose upload is under way.
 * @throws NotFound when it is complete, given up, or was never there
 */
export async function loadUpload(
  context: WorkshopContext,
  address: FileAddress,
  options: { readonly lock?: boolean } = {},
) {
  const file = await loadFile(context, address, options);
  if (file.state !== 'uploading' || file.uploadId === null)
    throw new NotFound('This upload is finished or was given up. It');
  return { ...file, uploadId: file.uploadId };
}
