import { and, eq, isNull } from 'drizzle-orm';
import { type z } from 'zod';
import { newId } from '../../../db/columns.ts';
import { workStretches } from '../../../db/schema/footage.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type StartStretchInput } from '../footage.ts';
import { announceFootage } from './announce-footage.ts';
import { requireStage } from './find-choices.ts';

type Start = z.output<typeof StartStretchInput> & { readonly build: string };

/** Starts the timer, or marks that the camera is off, from now on. @throws Invalid while one is running */
export const startStretch = verb({ may: 'footage.change' }, async (context, input: Start) => {
  const { db, workshop, actor, now } = context;
  const build = await loadBuild(context, input.build);
  await requireStage(context, build.id, input.stage);
  const [running] = await db
    .select({ id: workStretches.id })
    .from(workStretches)
    .where(
      and(
        eq(workStretches.buildId, build.id),
        isNull(workStretches.untilAt),
        isNull(workStretches.deletedAt),
      ),
    );
  if (running) throw new Invalid({ '': 'One is running already. Stop that one first.' });
  const id = newId();
  await db.insert(workStretches).values({
    id,
    workshopId: workshop.id,
    buildId: build.id,
    fromAt: now,
    sign: input.sign,
    stageId: input.stage,
    text: input.text,
    addedBy: actor.kind === 'account' ? actor.id : null,
  });
  await announceFootage(context, build.id);
  return { id, version: 1 };
});
