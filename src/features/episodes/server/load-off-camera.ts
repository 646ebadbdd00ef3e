import { and, eq, isNull } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { workStretches } from '../../../db/schema/footage.ts';
import { cutsOverWork, offCamera } from '../../../domain/footage/off-camera.ts';
import { editByIds, loadFootage } from '../../notes/server/footage-of-edits.ts';
import { findEditById } from '../../notes/server/load-edits.ts';
import { type EpisodeView } from '../../notes/server/episode-view.ts';
import { type OffCameraCut } from '../companion.ts';

/**
 * The cuts of an episode at which work is missing that was done with the camera off; none without an edit.
 * @param now until when work goes on whose end was not said yet
 */
export async function loadOffCamera(
  db: Database,
  buildId: string,
  { edit }: EpisodeView,
  now: Date,
): Promise<OffCameraCut[]> {
  if (edit === null) return [];
  const work = await db
    .select()
    .from(workStretches)
    .where(and(eq(workStretches.buildId, buildId), isNull(workStretches.deletedAt)));
  const stored = work.length === 0 ? null : await findEditById(db, edit.id);
  if (stored === null) return [];
  const { clips } = await loadFootage(db, buildId);
  const off = offCamera(
    work.map(({ fromAt, untilAt, sign, text }) => ({
      from: fromAt.getTime(),
      until: (untilAt ?? now).getTime(),
      sign,
      text,
    })),
    clips,
  );
  return cutsOverWork(editByIds(stored), clips, off).map(({ frame, seconds, texts }) => ({
    at: (frame * edit.rate.den) / edit.rate.num,
    minutes: Math.round(seconds / 60),
    texts: [...texts],
  }));
}
