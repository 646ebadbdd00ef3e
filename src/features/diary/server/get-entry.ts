import { loadBuild } from '../../builds/server/load-build.ts';
import { read } from '../../../server/verb.ts';
import { loadEntry } from './load-entry.ts';

/** One diary entry as the team sees it. @throws NotFound */
export const getEntry = read(
  { may: 'workshop.see-bench' },
  async (context, input: { readonly build: string; readonly entry: string }) =>
    loadEntry(context, (await loadBuild(context, input.build)).id, input.entry),
);
