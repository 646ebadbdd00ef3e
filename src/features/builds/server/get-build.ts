import { read } from '../../../server/verb.ts';
import { loadBuild } from './load-build.ts';

/** A build as its team sees it. @throws NotFound */
export const getBuild = read({ may: 'workshop.see-bench' }, (context, { build }: { build: string }) =>
  loadBuild(context, build),
);
