import { and, eq, sql } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** Something that differs whenever the list of a build's files does. */
export const getFilesTag = read(
  { may: 'workshop.see-bench' },
  async (context, input: { build: string }): Promise<string> => {
    const build = await loadBuild(context, input.build);
    const [row] = await context.db
      .select({
        count: sql<string>`count(*)`,
        // The sum, not the latest: of two changes at once the earlier may be seen last.
        changed: sql<string>`coalesce(sum(extract(epoch from ${files.updatedAt})), 0)`,
      })
      .from(files)
      .where(and(eq(files.workshopId, context.workshop.id), eq(files.buildId, build.id)));
    return `${row?.count ?? '0'}-${row?.changed ?? '0'}`;
  },
);
