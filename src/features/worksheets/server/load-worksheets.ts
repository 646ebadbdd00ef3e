import { and, desc, eq, isNull, type SQL } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { isSheetId, type KeptWorksheet } from '../worksheet.ts';

/** The worksheets of a build, the newest first. @param only which of them; all when left out */
export async function loadWorksheets(
  { db, workshop }: WorkshopContext,
  buildId: string,
  only?: SQL,
): Promise<KeptWorksheet[]> {
  const rows = await db
    .select({
      row: worksheets,
      stage: { id: stages.id, name: stages.name },
      part: { id: parts.id, number: parts.number, name: parts.name },
      entry: { id: diaryEntries.id, day: diaryEntries.day },
      episode: { id: episodes.id, number: episodes.number, title: episodes.title },
    })
    .from(worksheets)
    .leftJoin(stages, and(eq(stages.id, worksheets.stageId), isNull(stages.deletedAt)))
    .leftJoin(parts, and(eq(parts.id, worksheets.partId), isNull(parts.deletedAt)))
    .leftJoin(diaryEntries, and(eq(diaryEntries.id, worksheets.entryId), isNull(diaryEntries.deletedAt)))
    .leftJoin(episodes, and(eq(episodes.id, worksheets.episodeId), isNull(episodes.deletedAt)))
    .where(
      and(
        eq(worksheets.workshopId, workshop.id),
        eq(worksheets.buildId, buildId),
        isNull(worksheets.deletedAt),
        only,
      ),
    )
    .orderBy(desc(worksheets.id));
  return rows.flatMap(({ row, ...owners }) => {
    const { id, sheet, title, inputs, visibility, version } = row;
    return isSheetId(sheet) ? [{ id, sheet, title, inputs, visibility, version, of: ownerOf(owners) }] : [];
  });
}

/** One worksheet of a build. @throws NotFound */
export async function loadWorksheet(
  context: WorkshopContext,
  buildId: string,
  id: string,
): Promise<KeptWorksheet> {
  const [found] = await loadWorksheets(context, buildId, eq(worksheets.id, id));
  if (!found) throw new NotFound('This worksheet');
  return found;
}

interface Owners {
  readonly stage: { readonly id: string; readonly name: string } | null;
  readonly part: { readonly id: string; readonly number: string; readonly name: string } | null;
  readonly entry: { readonly id: string; readonly day: string } | null;
  readonly episode: { readonly id: string; readonly number: number; readonly title: string } | null;
}

function ownerOf({ stage, part, entry, episode }: Owners): KeptWorksheet['of'] {
  if (stage) return { kind: 'stage', id: stage.id, name: stage.name };
  if (part) return { kind: 'part', id: part.id, name: `${part.number} ${part.name}` };
  if (entry) return { kind: 'entry', id: entry.id, name: `Diary, ${entry.day}` };
  if (episode)
    return { kind: 'episode', id: episode.id, name: `Episode ${String(episode.number)}, ${episode.title}` };
  return null;
}
