import { and, eq, inArray, isNull, sql } from 'drizzle-orm';
import { type z } from 'zod';
import { clipParts, clips } from '../../../db/schema/footage.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type TagClipsInput } from '../footage.ts';
import { requireParts, requireStage } from './find-choices.ts';

type Tags = z.output<typeof TagClipsInput> & { readonly build: string };

/** Puts a stage and parts on several clips at once; parts they have already stay. @throws NotFound, Invalid */
export const tagClips = verb({ may: 'footage.change' }, async (context, input: Tags) => {
  const { db, workshop, now } = context;
  const build = await loadBuild(context, input.build);
  const stageId = input.stage === 'none' || input.stage === 'keep' ? null : input.stage;
  await requireStage(context, build.id, stageId);
  await requireParts(context, build.id, input.parts);
  const ids = [...new Set(input.clips)];
  const tagged = await db
    .update(clips)
    .set({
      ...(input.stage !== 'keep' && { stageId }),
      version: sql`${clips.version} + 1`,
      updatedAt: now,
    })
    .where(
      and(
        inArray(clips.id, ids),
        eq(clips.workshopId, workshop.id),
        eq(clips.buildId, build.id),
        isNull(clips.deletedAt),
      ),
    )
    .returning({ id: clips.id });
  if (tagged.length !== ids.length) throw new NotFound('One of these clips');
  const rows = ids.flatMap((clipId) =>
    [...new Set(input.parts)].map((partId) => ({ workshopId: workshop.id, clipId, partId })),
  );
  if (rows.length > 0) await db.insert(clipParts).values(rows).onConflictDoNothing();
  return { clips: ids.length };
});
