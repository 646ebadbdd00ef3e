import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from './load-build.ts';
import { loadStages } from './load-stages.ts';

/** The stages of a build that is on show, in order. @throws NotFound for a private build, too */
export const listPublicStages = read(
  { may: 'published.read' },
  async (context, { build: slug }: { readonly build: string }) => {
    const build = await loadBuild(context, slug);
    if (build.visibility !== 'public') throw new NotFound('This build');
    return { items: await loadStages(context, build.id), nextCursor: null };
  },
);
