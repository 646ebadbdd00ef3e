import { read } from '../../../server/verb.ts';
import { loadBuild } from './load-build.ts';
import { loadStages } from './load-stages.ts';

/** The stages of a build as its team sees them, in order. @throws NotFound */
export const listStages = read(
  { may: 'workshop.see-bench' },
  async (context, { build }: { readonly build: string }) => ({
    items: await loadStages(context, (await loadBuild(context, build)).id),
    nextCursor: null,
  }),
);
