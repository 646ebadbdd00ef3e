import { and, eq, inArray, isNull } from 'drizzle-orm';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { STAND_INS } from '../file.ts';

/**
 * Lets originals go, for good, where a copy stands in: of one file, or of all of a build. What no copy stands in
 * for stays.
 * @throws NotFound for one file that is not here or has no copy
 */
export const dropOriginals = verb(
  { may: 'footage.change' },
  async (context, { build: slug, file }: { build: string; file?: string | undefined }) => {
    const { db, workshop, now, services } = context;
    const build = await loadBuild(context, slug);
    const candidates = await db
      .select({ id: files.id })
      .from(files)
      .innerJoin(fileVariants, eq(fileVariants.fileId, files.id))
      .where(
        and(
          eq(files.workshopId, workshop.id),
          eq(files.buildId, build.id),
          eq(files.state, 'ready'),
          eq(files.originalKept, true),
          isNull(files.deletedAt),
          inArray(fileVariants.variant, [...STAND_INS]),
          file === undefined ? undefined : eq(files.id, file),
        ),
      )
      .for('update', { of: files });
    const ids = candidates.map(({ id }) => id);
    if (ids.length === 0) {
      if (file !== undefined) throw new NotFound('An original that could go');
      return { files: 0, bytes: 0 };
    }
    const dropped = await db
      .delete(fileVariants)
      .where(and(inArray(fileVariants.fileId, ids), eq(fileVariants.variant, 'original')))
      .returning({ bytes: fileVariants.bytes });
    await db.update(files).set({ originalKept: false, updatedAt: now }).where(inArray(files.id, ids));
    for (const fileId of ids) await services.jobs.enqueue(db, 'original-dropped', { fileId });
    return { files: ids.length, bytes: dropped.reduce((sum, { bytes }) => sum + bytes, 0) };
  },
);
