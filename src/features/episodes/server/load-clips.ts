import { and, asc, eq, isNull } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { cameras, clips } from '../../../db/schema/footage.ts';
import { type KnownClip } from '../../../domain/edit/propose-clips.ts';
import { type Rate } from '../../../domain/time/rate.ts';

/** A clip of the build as edits need it. */
export interface BuildClip extends KnownClip {
  /** Its name with what tells it from others of that name: camera and time. */
  readonly label: string;
  /** Null for one that is known by its name alone: nobody has said what it runs at. */
  readonly rate: Rate | null;
  /** Its first label in frames; null where it has none. */
  readonly startLabel: number | null;
  /** Length in frames; null until known. */
  readonly frames: number | null;
}

/** The clips of a build by name. */
export async function loadBuildClips(db: Database, buildId: string): Promise<BuildClip[]> {
  const rows = await db
    .select({ clip: clips, camera: cameras.name })
    .from(clips)
    .leftJoin(cameras, eq(cameras.id, clips.cameraId))
    .where(and(eq(clips.buildId, buildId), isNull(clips.deletedAt)))
    .orderBy(asc(clips.name), asc(clips.createdWall), asc(clips.id));
  return rows.map(({ clip, camera }) => {
    const { id, name, frames, startLabel, rateNum, rateDen, createdWall } = clip;
    const seconds = (count: number) => (count * rateDen) / rateNum;
    return {
      id,
      name,
      label: [name, camera, createdWall?.slice(0, 16)].filter(Boolean).join(' · '),
      rate: frames === null ? null : { num: rateNum, den: rateDen },
      startLabel,
      frames,
      labels:
        startLabel === null || frames === null ? null : [seconds(startLabel), seconds(startLabel + frames)],
    };
  });
}
