import { eq } from 'drizzle-orm';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { NotFound } from '../../../server/errors.ts';
import { type DiaryEntry } from '../diary.ts';
import { loadEntries } from './load-entries.ts';

/** One entry of a build's diary. @throws NotFound */
export async function loadEntry(context: WorkshopContext, buildId: string, id: string): Promise<DiaryEntry> {
  const { items } = await loadEntries(context, buildId, { only: eq(diaryEntries.id, id) });
  const [entry] = items;
  if (!entry) throw new NotFound('This diary entry');
  return entry;
}
