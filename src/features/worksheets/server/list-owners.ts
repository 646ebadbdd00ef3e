import { and, asc, desc, eq, isNull } from 'drizzle-orm';
import { stages } from '../../../db/schema/builds.ts';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { episodes } from '../../../db/schema/episodes.ts';
import { parts } from '../../../db/schema/parts.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';

/** Diary entries to choose from; the newest of them. */
const MOST_ENTRIES = 50;

/** What a worksheet of a build may belong to, as it is chosen. @throws NotFound */
export const listOwners = read(
  { may: 'worksheet.change' },
  async (context, input: { readonly build: string }) => {
    const { db } = context;
    const { id } = await loadBuild(context, input.build);
    const stageRows = await db
      .select({ id: stages.id, name: stages.name })
      .from(stages)
      .where(and(eq(stages.buildId, id), isNull(stages.deletedAt)))
      .orderBy(asc(stages.position), asc(stages.id));
    const partRows = await db
      .select({ id: parts.id, number: parts.number, name: parts.name })
      .from(parts)
      .where(and(eq(parts.buildId, id), isNull(parts.deletedAt)));
    const episodeRows = await db
      .select({ id: episodes.id, number: episodes.number, title: episodes.title })
      .from(episodes)
      .where(and(eq(episodes.buildId, id), isNull(episodes.deletedAt)))
      .orderBy(asc(episodes.number));
    const entryRows = await db
      .select({ id: diaryEntries.id, day: diaryEntries.day })
      .from(diaryEntries)
      .where(and(eq(diaryEntries.buildId, id), isNull(diaryEntries.deletedAt)))
      .orderBy(desc(diaryEntries.day), desc(diaryEntries.id))
      .limit(MOST_ENTRIES);
    const byNumber = new Intl.Collator('en', { numeric: true });
    return {
      items: [
        ...stageRows.map((one) => ({ value: `stage:${one.id}`, label: `Stage: ${one.name}` })),
        ...partRows
          .sort((a, b) => byNumber.compare(a.number, b.number))
          .map((one) => ({ value: `part:${one.id}`, label: `Part ${one.number}, ${one.name}` })),
        ...episodeRows.map((one) => ({
          value: `episode:${one.id}`,
          label: `Episode ${String(one.number)}, ${one.title}`,
        })),
        ...entryRows.map((one) => ({ value: `entry:${one.id}`, label: `Diary, ${one.day}` })),
      ],
      nextCursor: null,
    };
  },
);
