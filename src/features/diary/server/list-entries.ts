import { loadBuild } from '../../builds/server/load-build.ts';
import { read } from '../../../server/verb.ts';
import { type EntryCursor, loadEntries } from './load-entries.ts';

/** The diary of a build as its team sees it, the newest day first. @throws NotFound */
export const listEntries = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string; readonly after?: EntryCursor | null }) =>
    loadEntries(context, (await loadBuild(context, input.build)).id, { after: input.after ?? null }),
);
