import { and, asc, eq, isNull } from 'drizzle-orm';
import Fraction from 'fraction.js';
import { cameras, clips, slates } from '../../../db/schema/footage.ts';
import { clockErrorAt } from '../../../domain/footage/camera-clock.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadFilmedClips } from './load-filmed-clips.ts';

/** The cameras of the workshop, each with its clips in a build, its slates and how far its clock is off. */
export const listCameras = read(
  { may: 'workshop.see-bench' },
  async (context, { build: slug }: { readonly build: string }) => {
    const { db, workshop, now } = context;
    const build = await loadBuild(context, slug);
    const rows = await db
      .select()
      .from(cameras)
      .where(and(eq(cameras.workshopId, workshop.id), isNull(cameras.deletedAt)))
      .orderBy(asc(cameras.name));
    const loaded = await loadFilmedClips(db, build.id, now);
    const slateRows = await db
      .select({ slate: slates, clip: { id: clips.id, name: clips.name, cameraId: clips.cameraId } })
      .from(slates)
      .innerJoin(clips, eq(clips.id, slates.clipId))
      .where(and(eq(clips.buildId, build.id), isNull(clips.deletedAt), isNull(slates.deletedAt)))
      .orderBy(asc(slates.shopAt));
    const items = rows.map(({ id, name, version, creationMeans, localAsUtc, timeZone }) => {
      const own = loaded.filter(({ cameraId }) => cameraId === id);
      const clock = own.find(({ by, clock: known }) => by === 'camera' && known.length > 0)?.clock ?? [];
      const last = clock.at(-1);
      const error = last === undefined ? null : clockErrorAt(clock, last.camera ?? new Fraction(0));
      return {
        id,
        name,
        version,
        creationMeans,
        localAsUtc,
        timeZone,
        clips: own.length,
        slates: slateRows
          .filter(({ clip }) => clip.cameraId === id)
          .map(({ slate, clip }) => ({
            id: slate.id,
            shopAt: slate.shopAt.getTime(),
            readBy: slate.readBy,
            clip: { id: clip.id, name: clip.name },
          })),
        /** Seconds that the shop is ahead of it, and a day; null without a slate, or with one. */
        offset: error?.offset.valueOf() ?? null,
        drift: error?.drift?.valueOf() ?? null,
      };
    });
    return { items, nextCursor: null };
  },
);
