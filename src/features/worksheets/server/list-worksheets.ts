import { read } from '../../../server/verb.ts';
import { loadBuild } from '../../builds/server/load-build.ts';
import { loadWorksheets } from './load-worksheets.ts';

/** The worksheets of a build as its team sees them, the newest first. @throws NotFound */
export const listWorksheets = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string }) => ({
    items: await loadWorksheets(context, (await loadBuild(context, input.build)).id),
    nextCursor: null,
  }),
);
