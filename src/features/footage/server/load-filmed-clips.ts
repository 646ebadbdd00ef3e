import { and, asc, eq, inArray, isNull } from 'drizzle-orm';
import Fraction from 'fraction.js';
import { type Database } from '../../../db/client.ts';
import { builds } from '../../../db/schema/builds.ts';
import { cameras, clips, slates } from '../../../db/schema/footage.ts';
import { workshops } from '../../../db/schema/workshops.ts';
import { clipLength, type ClipTiming, timeClips } from '../../../domain/footage/film-clips.ts';
import { type Rate } from '../../../domain/time/rate.ts';

/** A clip of a build with what is known of when it ran. */
export interface LoadedClip extends ClipTiming {
  readonly id: string;
  readonly name: string;
  readonly cameraId: string | null;
  readonly fileId: string | null;
  /** How long it plays, in seconds; null until known. */
  readonly length: Fraction | null;
  readonly frames: number | null;
  readonly rate: Rate;
  /** Seconds of the shop that a second of it shows. */
  readonly pace: Fraction;
  /** Its first timecode label, in seconds since 00:00:00:00; 0 where it has none. */
  readonly label: Fraction;
  /** The same in frames; null where it has none. */
  readonly startLabel: number | null;
  readonly drop: boolean;
  /** When frames begin, in milliseconds since the first; null where they come at a constant rate. */
  readonly frameTimes: readonly number[] | null;
  readonly continuesId: string | null;
  readonly stageId: string | null;
}

/**
 * The clips of a build that are not deleted, in the order they were added, each with when it began by its camera's
 * clock and that clock as the slates of the whole workshop set it right.
 */
export async function loadFilmedClips(
  db: Database,
  buildId: string,
  now: Date = new Date(),
): Promise<LoadedClip[]> {
  const rows = await db
    .select()
    .from(clips)
    .where(and(eq(clips.buildId, buildId), isNull(clips.deletedAt)))
    .orderBy(asc(clips.id));
  const timings = await timeRows(db, rows, now);
  return rows.map((row) => {
    const rate = { num: row.rateNum, den: row.rateDen };
    const timing = timings.get(row.id);
    if (timing === undefined) throw new Error('A clip was not timed.');
    return {
      ...timing,
      id: row.id,
      name: row.name,
      cameraId: row.cameraId,
      fileId: row.fileId,
      length: clipLength({ frames: row.frames, rate }),
      frames: row.frames,
      rate,
      pace: new Fraction(row.paceNum, row.paceDen),
      label: new Fraction(row.startLabel ?? 0).mul(rate.den).div(rate.num),
      startLabel: row.startLabel,
      drop: row.drop,
      frameTimes: row.frameTimes,
      continuesId: row.continuesId,
      stageId: row.stageId,
    };
  });
}

type ClipRow = typeof clips.$inferSelect;

/** Times clips of one build; a camera's slates may stand on clips of another build of its workshop. */
async function timeRows(db: Database, rows: readonly ClipRow[], now: Date): Promise<Map<string, ClipTiming>> {
  const [first] = rows;
  if (first === undefined) return new Map();
  const [zone] = await db
    .select({ timeZone: workshops.timeZone })
    .from(builds)
    .innerJoin(workshops, eq(workshops.id, builds.workshopId))
    .where(eq(builds.id, first.buildId));
  const cameraIds = [...new Set(rows.flatMap(({ cameraId }) => cameraId ?? []))];
  const cameraRows =
    cameraIds.length === 0 ? [] : await db.select().from(cameras).where(inArray(cameras.id, cameraIds));
  const slateRows = await db
    .select({ slate: slates, clip: clips })
    .from(slates)
    .innerJoin(clips, eq(clips.id, slates.clipId))
    .where(and(eq(slates.workshopId, first.workshopId), isNull(slates.deletedAt), isNull(clips.deletedAt)))
    .orderBy(asc(slates.id));
  const own = new Set(rows.map(({ id }) => id));
  const elsewhere = slateRows.filter(({ clip }) => !own.has(clip.id)).map(({ clip }) => clip);
  const all = [...rows, ...new Map(elsewhere.map((clip) => [clip.id, clip])).values()];
  return timeClips(
    all.map((row) => ({
      id: row.id,
      cameraId: row.cameraId,
      frames: row.frames,
      rate: { num: row.rateNum, den: row.rateDen },
      pace: new Fraction(row.paceNum, row.paceDen),
      createdWall: row.createdWall?.replace(' ', 'T') ?? null,
      createdOffset: row.createdOffset,
      startSetAt: row.startSetAt?.getTime() ?? null,
      frameTimes: row.frameTimes,
      continuesId: row.continuesId,
    })),
    cameraRows,
    slateRows.map(({ slate }) => ({
      clipId: slate.clipId,
      frame: slate.frame,
      shopAt: slate.shopAt.getTime(),
    })),
    { timeZone: zone?.timeZone ?? 'UTC', now: now.getTime() },
  );
}
