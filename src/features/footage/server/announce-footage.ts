import { and, eq, isNull } from 'drizzle-orm';
import { clips } from '../../../db/schema/footage.ts';
import { type WorkshopContext } from '../../../server/context.ts';

/** Tells, in the verb's transaction, that a build's clips or the times they ran at have changed. */
export function announceFootage({ db, services }: WorkshopContext, buildId: string): Promise<void> {
  return services.jobs.enqueue(db, 'footage-changed', { build: buildId });
}

/** The same of every build that has clips of a camera. */
export async function announceCamera(context: WorkshopContext, cameraId: string): Promise<void> {
  const rows = await context.db
    .selectDistinct({ buildId: clips.buildId })
    .from(clips)
    .where(and(eq(clips.cameraId, cameraId), isNull(clips.deletedAt)));
  for (const { buildId } of rows) await announceFootage(context, buildId);
}

/** The same when a slate of a clip comes or goes: it sets right every clip of the camera. */
export async function announceTimes(
  context: WorkshopContext,
  { cameraId, buildId }: { readonly cameraId: string | null; readonly buildId: string },
): Promise<void> {
  if (cameraId === null) await announceFootage(context, buildId);
  else await announceCamera(context, cameraId);
}
