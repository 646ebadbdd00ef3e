import { eq } from 'drizzle-orm';
import { diaryEntries } from '../../../db/schema/diary.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadEntries } from './load-entries.ts';

/** The public diary entries of a build that is on show, the newest day first. @throws NotFound */
export const listPublicEntries = read(
  { may: 'published.read' },
  async (context, input: { readonly build: string }) => {
    const build = await loadBuild(context, input.build);
    if (build.visibility !== 'public') throw new NotFound('This build');
    return loadEntries(context, build.id, { only: eq(diaryEntries.visibility, 'public') });
  },
);
