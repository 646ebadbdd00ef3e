import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheet } from './load-worksheets.ts';

/** A worksheet that its maker shows, with its build. @throws NotFound */
export const getPublicWorksheet = read(
  { may: 'published.read' },
  async (context, input: { readonly build: string; readonly worksheet: string }) => {
    const build = await loadBuild(context, input.build);
    const worksheet = await loadWorksheet(context, build.id, input.worksheet);
    if (build.visibility !== 'public' || worksheet.visibility !== 'public')
      throw new NotFound('This worksheet');
    return { build, worksheet };
  },
);
