import { and, eq, inArray, isNull } from 'drizzle-orm';
import { cameras } from '../../../db/schema/footage.ts';
import { parts } from '../../../db/schema/parts.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { loadStages } from '../../builds/server/load-stages.ts';

/** @throws Invalid at `stage` when the build has no such stage any more */
export async function requireStage(
  context: WorkshopContext,
  buildId: string,
  stage: string | null,
): Promise<void> {
  if (stage === null) return;
  const found = (await loadStages(context, buildId)).some(({ id }) => id === stage);
  if (!found) throw new Invalid({ stage: 'That stage is not in this build any more. Choose another.' });
}

/** @throws Invalid at `camera` when the workshop has no such camera any more */
export async function requireCamera({ db, workshop }: WorkshopContext, camera: string | null): Promise<void> {
  if (camera === null) return;
  const [found] = await db
    .select({ id: cameras.id })
    .from(cameras)
    .where(and(eq(cameras.id, camera), eq(cameras.workshopId, workshop.id), isNull(cameras.deletedAt)));
  if (!found) throw new Invalid({ camera: 'That camera is not there any more. Choose another.' });
}

/** @throws Invalid at `parts` when one is not of this build */
export async function requireParts(
  { db, workshop }: WorkshopContext,
  buildId: string,
  ids: readonly string[],
): Promise<void> {
  const unique = [...new Set(ids)];
  if (unique.length === 0) return;
  const found = await db
    .select({ id: parts.id })
    .from(parts)
    .where(
      and(
        inArray(parts.id, unique),
        eq(parts.workshopId, workshop.id),
        eq(parts.buildId, buildId),
        isNull(parts.deletedAt),
      ),
    );
  if (found.length !== unique.length)
    throw new Invalid({ parts: 'One of these parts is not in the parts list any more. Choose again.' });
}
