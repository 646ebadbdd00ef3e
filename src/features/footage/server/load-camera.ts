import { and, eq, isNull } from 'drizzle-orm';
import { cameras } from '../../../db/schema/footage.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Conflict, NotFound } from '../../../server/errors.ts';

export type Camera = typeof cameras.$inferSelect;

/**
 * A camera of the workshop, locked for the change that follows.
 * @param options.version that the change saw
 * @throws NotFound; Conflict with the stored camera
 */
export async function loadCameraAt(
  { db, workshop }: WorkshopContext,
  id: string,
  options: { readonly version: number; readonly deleted?: boolean },
): Promise<Camera> {
  const [row] = await db
    .select()
    .from(cameras)
    .where(
      and(
        eq(cameras.id, id),
        eq(cameras.workshopId, workshop.id),
        options.deleted === true ? undefined : isNull(cameras.deletedAt),
      ),
    )
    .for('update');
  if (!row) throw new NotFound('This camera');
  if (row.version !== options.version)
    throw new Conflict(row, 'Someone else saved this camera in the meantime. Look it over and save again.');
  return row;
}
