import { loadBuild } from '../../builds/server/load-build.ts';
import { read } from '../../../server/verb.ts';
import { loadParts } from './load-parts.ts';

/** The parts of a build as its team sees them, by number. @throws NotFound */
export const listParts = read(
  { may: 'workshop.see-bench' },
  async (context, { build }: { readonly build: string }) => ({
    items: await loadParts(context, (await loadBuild(context, build)).id),
    nextCursor: null,
  }),
);
