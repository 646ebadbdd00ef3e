import { loadBuild } from '../../builds/server/load-build.ts';
import { verb } from '../../../server/verb.ts';
import { applyChange } from './apply-change.ts';
import { loadPart } from './load-parts.ts';

/** Deletes a part that nothing refers to. @throws Invalid when something does; Conflict */
export const deletePart = verb(
  { may: 'part.change' },
  async (context, input: { readonly build: string; readonly part: string; readonly version: number }) => {
    const { id: buildId } = await loadBuild(context, input.build);
    const { id } = await loadPart(context, buildId, input.part);
    await applyChange(context, buildId, { do: 'delete', id, version: input.version });
    return { id, version: input.version + 1 };
  },
);
