import { eq } from 'drizzle-orm';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { read } from '../../../server/verb.ts';
import { type EntryCursor, loadEntries } from './load-entries.ts';

interface Asked {
  readonly build: string;
  readonly after?: EntryCursor | null;
  /** Only those of this day. */
  readonly day?: string;
}

/** The diary of a build as its team sees it, the newest day first. @throws NotFound */
export const listEntries = read(
  { may: 'workshop.see-bench' },
  async (context, { build, after, day }: Asked) =>
    loadEntries(context, (await loadBuild(context, build)).id, {
      after: after ?? null,
      only: day === undefined ? undefined : eq(diaryEntries.day, day),
    }),
);
