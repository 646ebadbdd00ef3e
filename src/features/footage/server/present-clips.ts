import { and, asc, eq, inArray, sql } from 'drizzle-orm';
import Fraction from 'fraction.js';
import { stages } from '../../../db/schema/builds.ts';
import { files } from '../../../db/schema/files.ts';
import { cameras, clipParts, clips, clipThumbnails } from '../../../db/schema/footage.ts';
import { parts } from '../../../db/schema/parts.ts';
import { shopStretch } from '../../../domain/footage/place-on-clips.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { type ShownClip } from '../day.ts';
import { type LoadedClip, loadFilmedClips } from './load-filmed-clips.ts';

/** The clips of a build as its pages show them, by when they ran; those of unknown time last. */
export async function presentClips({ db, now }: WorkshopContext, buildId: string): Promise<ShownClip[]> {
  const loaded = await loadFilmedClips(db, buildId, now);
  const rows = await db
    .select({
      id: clips.id,
      version: clips.version,
      pace: { num: clips.paceNum, den: clips.paceDen },
      camera: { id: cameras.id, name: cameras.name },
      stage: { id: stages.id, name: stages.name },
      hasFilm: sql<boolean>`${files.kind} is not distinct from 'video'`,
      hasPicture: sql<boolean>`${clipThumbnails.clipId} is not null`,
    })
    .from(clips)
    .leftJoin(cameras, eq(cameras.id, clips.cameraId))
    .leftJoin(stages, and(eq(stages.id, clips.stageId), sql`${stages.deletedAt} is null`))
    .leftJoin(files, eq(files.id, clips.fileId))
    .leftJoin(clipThumbnails, eq(clipThumbnails.clipId, clips.id))
    .where(and(eq(clips.buildId, buildId), sql`${clips.deletedAt} is null`));
  const rowOf = new Map(rows.map((row) => [row.id, row]));
  const partsOf = await loadParts(db, [...rowOf.keys()]);
  return loaded
    .flatMap((clip): ShownClip[] => {
      const row = rowOf.get(clip.id);
      if (row === undefined) return [];
      const { version, pace, camera, stage, hasFilm, hasPicture } = row;
      return [
        {
          ...ranAt(clip),
          id: clip.id,
          name: clip.name,
          version,
          camera,
          stage,
          pace,
          hasFilm,
          hasPicture,
          length: clip.length?.valueOf() ?? null,
          rate: clip.rate,
          by: clip.by,
          problem: clip.problem,
          parts: partsOf.get(clip.id) ?? [],
          fileId: clip.fileId,
          continuesId: clip.continuesId,
        },
      ];
    })
    .sort((a, b) => (a.from ?? Infinity) - (b.from ?? Infinity) || (a.id < b.id ? -1 : 1));
}

/** To the millisecond, for showing. */
function ranAt({ start, length, ...clip }: LoadedClip): Pick<ShownClip, 'from' | 'until'> {
  if (start === null) return { from: null, until: null };
  const [from, until] = shopStretch({ ...clip, start, length: length ?? new Fraction(0) });
  return { from: Math.round(from.valueOf()), until: Math.round(until.valueOf()) };
}

async function loadParts(db: WorkshopContext['db'], ids: readonly string[]) {
  const found = new Map<string, { id: string; number: string; name: string }[]>();
  if (ids.length === 0) return found;
  const rows = await db
    .select({ clipId: clipParts.clipId, id: parts.id, number: parts.number, name: parts.name })
    .from(clipParts)
    .innerJoin(parts, eq(parts.id, clipParts.partId))
    .where(inArray(clipParts.clipId, [...ids]))
    .orderBy(asc(sql`${parts.number} collate "part_numbers"`));
  for (const { clipId, ...part } of rows) found.set(clipId, [...(found.get(clipId) ?? []), part]);
  return found;
}
