import { and, asc, desc, eq, inArray, isNull, lt, or, type SQL } from 'drizzle-orm';
import { accounts } from '../../../db/schema/accounts.ts';
import { stages } from '../../../db/schema/builds.ts';
import { diaryEntries, diaryPhotos } from '../../../db/schema/diary.ts';
import { files } from '../../../db/schema/files.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { renderMarkdown } from '../../../server/render-markdown.ts';
import { type DiaryEntry, type DiaryPhoto } from '../diary.ts';

/** Entries on one page. */
const PAGE = 50;

/** Where a page of the diary begins: after this entry. */
export interface EntryCursor {
  readonly day: string;
  readonly id: string;
}

/**
 * Entries of a build, the newest day first.
 * @param wanted which of them; all when left out
 */
export async function loadEntries(
  { db, workshop }: WorkshopContext,
  buildId: string,
  wanted: { readonly only?: SQL | undefined; readonly after?: EntryCursor | null } = {},
): Promise<{ items: DiaryEntry[]; nextCursor: EntryCursor | null }> {
  const { only, after } = wanted;
  const rows = await db
    .select({ entry: diaryEntries, stage: stages.name, writtenBy: accounts.name })
    .from(diaryEntries)
    .leftJoin(stages, and(eq(stages.id, diaryEntries.stageId), isNull(stages.deletedAt)))
    .leftJoin(accounts, eq(accounts.id, diaryEntries.writtenBy))
    .where(
      and(
        eq(diaryEntries.workshopId, workshop.id),
        eq(diaryEntries.buildId, buildId),
        isNull(diaryEntries.deletedAt),
        only,
        after == null
          ? undefined
          : or(
              lt(diaryEntries.day, after.day),
              and(eq(diaryEntries.day, after.day), lt(diaryEntries.id, after.id)),
            ),
      ),
    )
    .orderBy(desc(diaryEntries.day), desc(diaryEntries.id))
    .limit(PAGE + 1);
  const shown = rows.slice(0, PAGE);
  const photos = await loadPhotos(
    db,
    shown.map(({ entry }) => entry.id),
  );
  const last = rows.length > PAGE ? shown.at(-1)?.entry : undefined;
  return {
    items: shown.map(({ entry, stage, writtenBy }) => ({
      id: entry.id,
      day: entry.day,
      stage: entry.stageId !== null && stage !== null ? { id: entry.stageId, name: stage } : null,
      text: entry.text,
      html: renderMarkdown(entry.text),
      visibility: entry.visibility,
      writtenBy,
      photos: photos.get(entry.id) ?? [],
      version: entry.version,
    })),
    nextCursor: last ? { day: last.day, id: last.id } : null,
  };
}

async function loadPhotos(
  db: WorkshopContext['db'],
  entries: readonly string[],
): Promise<Map<string, DiaryPhoto[]>> {
  const found = new Map<string, DiaryPhoto[]>();
  if (entries.length === 0) return found;
  const rows = await db
    .select({
      entry: diaryPhotos.entryId,
      file: diaryPhotos.fileId,
      description: diaryPhotos.description,
      width: files.width,
      height: files.height,
    })
    .from(diaryPhotos)
    .innerJoin(files, eq(files.id, diaryPhotos.fileId))
    .where(and(inArray(diaryPhotos.entryId, [...entries]), eq(files.state, 'ready'), isNull(files.deletedAt)))
    .orderBy(asc(diaryPhotos.position));
  for (const { entry, ...photo } of rows) found.set(entry, [...(found.get(entry) ?? []), photo]);
  return found;
}
