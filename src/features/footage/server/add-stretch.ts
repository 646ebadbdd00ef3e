import { type z } from 'zod';
import { newId } from '../../../db/columns.ts';
import { workStretches } from '../../../db/schema/footage.ts';
import { instantOfWall } from '../../../domain/time/wall-time.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type AddStretchInput } from '../footage.ts';
import { announceFootage } from './announce-footage.ts';
import { requireStage } from './find-choices.ts';

type Stretch = z.output<typeof AddStretchInput> & { readonly build: string };
const DAY_MS = 86_400_000;

/** Writes down a stretch of work with the camera off; an end before its beginning is of the next day. @throws Invalid */
export const addStretch = verb({ may: 'footage.change' }, async (context, input: Stretch) => {
  const { db, workshop, actor } = context;
  const build = await loadBuild(context, input.build);
  await requireStage(context, build.id, input.stage);
  const at = (time: string) => instantOfWall(workshop.timeZone, `${input.day} ${time.padStart(5, '0')}`);
  const [from, until] = [at(input.from), at(input.until)];
  if (from === null) throw new Invalid({ from: 'There is no such time on that day.' });
  if (until === null || until === from) throw new Invalid({ until: 'Write when it ended, such as 15:05.' });
  const id = newId();
  await db.insert(workStretches).values({
    id,
    workshopId: workshop.id,
    buildId: build.id,
    fromAt: new Date(from),
    untilAt: new Date(until > from ? until : until + DAY_MS),
    sign: 'diary',
    stageId: input.stage,
    text: input.text,
    addedBy: actor.kind === 'account' ? actor.id : null,
  });
  await announceFootage(context, build.id);
  return { id, version: 1 };
});
