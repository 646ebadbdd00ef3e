import { and, asc, eq, isNull, sql } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
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
      entries: sql<number>`(select count(*)::int from ${diaryEntries}
        where ${diaryEntries.stageId} = ${stages.id} and ${diaryEntries.deletedAt} is null)`,
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
