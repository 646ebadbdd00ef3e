import { eq } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { clips } from '../../../db/schema/footage.ts';
import { type Database } from '../../../db/client.ts';
import { type Chapter } from '../../../domain/chapters/chapter.ts';
import { proposeChapters } from '../../../domain/chapters/propose-chapters.ts';
import { rateOf } from '../../../domain/edit/edit.ts';
import { type Rate } from '../../../domain/time/rate.ts';
import { findDraftEdit } from '../../notes/server/load-edits.ts';

/** Chapters where the stage of the footage changes in the newest edit, with the rate that it counts in. */
export async function proposeEpisodeChapters(
  db: Database,
  episode: { readonly id: string; readonly buildId: string },
  length: number | null,
): Promise<{ readonly chapters: readonly Chapter[]; readonly rate: Rate | null }> {
  const stored = await findDraftEdit(db, episode.id);
  if (stored === null) return { chapters: [], rate: null };
  const rows = await db
    .select({ id: clips.id, stage: stages.name })
    .from(clips)
    .innerJoin(stages, eq(stages.id, clips.stageId))
    .where(eq(clips.buildId, episode.buildId));
  const stageOf = new Map(rows.map(({ id, stage }) => [id, stage]));
  const { edit, clipIds } = stored;
  const moments = edit.picture.flatMap(({ clip, record }) => {
    const stage = stageOf.get(clipIds.get(clip) ?? '');
    const at = Number(record.in.div(rateOf(edit.rate)).mul(1000).ceil());
    return stage === undefined ? [] : [{ at, stage }];
  });
  return { chapters: proposeChapters(moments, length), rate: edit.rate };
}
