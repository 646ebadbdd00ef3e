import { loadBuild } from '../../builds/server/load-build.ts';
import { verb } from '../../../server/verb.ts';
import { type PartChange } from '../part.ts';
import { applyChanges } from './apply-changes.ts';

/** Saves what was typed or pasted into the table, all of it or nothing. @throws as `applyChanges` does */
export const saveParts = verb(
  { may: 'part.change' },
  async (context, input: { readonly build: string; readonly changes: readonly PartChange[] }) => ({
    items: await applyChanges(context, (await loadBuild(context, input.build)).id, input.changes),
  }),
);
