import { and, desc, eq, inArray, isNull, lt } from 'drizzle-orm';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { type FilePage, FILES_AT_ONCE, type ListFiles } from '../file.ts';
import { presentFile } from './present-file.ts';

/** The files of a build, newest first. */
export const listFiles = read(
  { may: 'workshop.see-bench' },
  async (context, input: ListFiles & { build: string }): Promise<FilePage> => {
    const { db, workshop } = context;
    const build = await loadBuild(context, input.build);
    const rows = await db
      .select()
      .from(files)
      .where(
        and(
          eq(files.workshopId, workshop.id),
          eq(files.buildId, build.id),
          isNull(files.deletedAt),
          input.purpose === undefined ? undefined : eq(files.purpose, input.purpose),
          input.before === undefined ? undefined : lt(files.id, input.before),
        ),
      )
      .orderBy(desc(files.id))
      .limit(FILES_AT_ONCE + 1);
    const shown = rows.slice(0, FILES_AT_ONCE);
    const ids = shown.map(({ id }) => id);
    const variants =
      ids.length === 0 ? [] : await db.select().from(fileVariants).where(inArray(fileVariants.fileId, ids));
    return {
      items: shown.map((row) =>
        presentFile(
          row,
          variants.filter(({ fileId }) => fileId === row.id),
        ),
      ),
      nextCursor: rows.length > FILES_AT_ONCE ? (shown.at(-1)?.id ?? null) : null,
    };
  },
);
