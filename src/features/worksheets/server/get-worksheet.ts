import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheet } from './load-worksheets.ts';

/** A worksheet as its team sees it. @throws NotFound */
export const getWorksheet = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string; readonly worksheet: string }) =>
    loadWorksheet(context, (await loadBuild(context, input.build)).id, input.worksheet),
);
