import { and, eq, isNull } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { type AddWorksheet } from '../worksheet.ts';

const TABLES = { stage: stages, part: parts, entry: diaryEntries, episode: episodes } as const;

/** The columns that say what a worksheet belongs to. @throws Invalid at `of` for what is not of the build */
export async function findOwner({ db, workshop }: WorkshopContext, buildId: string, of: AddWorksheet['of']) {
  const nobody = { stageId: null, partId: null, entryId: null, episodeId: null };
  if (of === null) return nobody;
  const table = TABLES[of.kind];
  const [found] = await db
    .select({ id: table.id })
    .from(table)
    .where(
      and(
        eq(table.id, of.id),
        eq(table.workshopId, workshop.id),
        eq(table.buildId, buildId),
        isNull(table.deletedAt),
      ),
    );
  if (!found) throw new Invalid({ of: 'That is not here any more. Choose again.' });
  return { ...nobody, [`${of.kind}Id`]: found.id };
}
