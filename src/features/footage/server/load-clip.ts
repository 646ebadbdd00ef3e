import { and, eq, isNull } from 'drizzle-orm';
import { clips } from '../../../db/schema/footage.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** What names a clip: its build in the address, and its id. */
export interface ClipRef {
  readonly build: string;
  readonly clip: string;
}
export type StoredClip = typeof clips.$inferSelect;

/** A clip of the workshop's build. @throws NotFound */
export async function loadClip(
  context: WorkshopContext,
  { build: slug, clip: id }: ClipRef,
  options: { readonly lock?: boolean; readonly deleted?: boolean } = {},
): Promise<StoredClip> {
  const build = await loadBuild(context, slug);
  const query = context.db
    .select()
    .from(clips)
    .where(
      and(
        eq(clips.id, id),
        eq(clips.workshopId, context.workshop.id),
        eq(clips.buildId, build.id),
        options.deleted === true ? undefined : isNull(clips.deletedAt),
      ),
    );
  const [row] = options.lock === true ? await query.for('update') : await query;
  if (!row) throw new NotFound('This clip');
  return row;
}

/** The same, locked for a change. @throws NotFound; Conflict when it is not at the version that the change saw */
export async function loadClipAt(
  context: WorkshopContext,
  ref: ClipRef & { readonly version: number },
  options: { readonly deleted?: boolean } = {},
): Promise<StoredClip> {
  const row = await loadClip(context, ref, { ...options, lock: true });
  if (row.version !== ref.version) {
    const { id, name, version } = row;
    throw new Conflict(
      { id, name, version },
      'Someone else saved this clip in the meantime. What you entered is kept; look it over and save again.',
    );
  }
  return row;
}
