import { loadBuild } from '../../builds/server/load-build.ts';
import { read } from '../../../server/verb.ts';
import { loadPart } from './load-parts.ts';

/** One part of a build as its team sees it. @throws NotFound */
export const getPart = read(
  { may: 'workshop.see-bench' },
  async (context, { build, part }: { readonly build: string; readonly part: string }) =>
    loadPart(context, (await loadBuild(context, build)).id, part),
);
