import { eq } from 'drizzle-orm';
import { worksheets } from '../../../db/schema/worksheets.ts';
import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheets } from './load-worksheets.ts';

/** The worksheets that the maker of a build shows, the newest first. @throws NotFound */
export const listPublicWorksheets = read(
  { may: 'published.read' },
  async (context, input: { readonly build: string }) => {
    const build = await loadBuild(context, input.build);
    if (build.visibility !== 'public') throw new NotFound('This build');
    return {
      items: await loadWorksheets(context, build.id, eq(worksheets.visibility, 'public')),
      nextCursor: null,
    };
  },
);
