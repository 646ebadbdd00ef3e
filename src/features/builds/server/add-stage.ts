import { sql } from 'drizzle-orm';
import { newId } from '../../../db/columns.ts';
import { stages } from '../../../db/schema/builds.ts';
import { Invalid } from '../../../server/errors.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { verb } from '../../../server/verb.ts';
import { type AddStage, MOST_STAGES } from '../stage.ts';
import { loadBuild } from './load-build.ts';
import { loadStages } from './load-stages.ts';

/** Adds a stage after the others. @throws Invalid when the build has as many as one may have */
export const addStage = verb(
  { may: 'build.change' },
  async (context, input: AddStage & { readonly build: string }) => {
    const { db, workshop } = context;
    const build = await loadBuild(context, input.build);
    if ((await loadStages(context, build.id)).length >= MOST_STAGES) {
      throw new Invalid({ '': `A build has at most ${String(MOST_STAGES)} stages. Nothing was added.` });
    }
    const id = newId();
    await db.insert(stages).values({
      id,
      workshopId: workshop.id,
      buildId: build.id,
      name: input.name,
      about: input.about,
      position: sql`(select coalesce(max(position), 0) + 1 from stages where build_id = ${build.id})`,
    });
    await announcePageChanges(db, [`build:${build.id}`]);
    return { id, version: 1 };
  },
);
