import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { type Stage } from '../stage.ts';

/** The stages of a build, in order. */
export function loadStages({ db, workshop }: WorkshopContext, buildId: string): Promise<Stage[]> {
  return db
    .select({
      id: stages.id,
      name: stages.name,
      about: stages.about,
      version: stages.version,
      // Named in full: of one table alone the columns would be written without it, and mean the inner one's.
      entries: sql<number>`(select count(*)::int from diary_entries
        where diary_entries.stage_id = stages.id and diary_entries.deleted_at is null)`,
    })
    .from(stages)
    .where(and(eq(stages.workshopId, workshop.id), eq(stages.buildId, buildId), isNull(stages.deletedAt)))
    .orderBy(asc(stages.position), asc(stages.id));
}

/** One stage of a build. @throws NotFound */
export async function loadStage(context: WorkshopContext, buildId: string, id: string): Promise<Stage> {
  const stage = (await loadStages(context, buildId)).find((one) => one.id === id);
  if (!stage) throw new NotFound('This stage');
  return stage;
}
