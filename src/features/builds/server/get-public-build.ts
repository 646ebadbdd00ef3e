import { NotFound } from '../../../server/errors.ts';
import { read } from '../../../server/verb.ts';
import { loadBuild } from './load-build.ts';

/** A build that is on show to everyone. @throws NotFound for a private one, too */
export const getPublicBuild = read(
  { may: 'published.read' },
  async (context, { build: slug }: { build: string }) => {
    const build = await loadBuild(context, slug);
    if (build.visibility !== 'public') throw new NotFound('This build');
    return build;
  },
);
