import { loadBuild } from '../../builds/server/load-build.ts';
import { NotFound } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { applyChange } from './apply-change.ts';

/** Brings a deleted part back. @throws Invalid at `number` when it was given to another meanwhile; Conflict */
export const restorePart = verb(
  { may: 'part.change' },
  async (context, input: { readonly build: string; readonly part: string; readonly version: number }) => {
    const { id: buildId } = await loadBuild(context, input.build);
    const change = { do: 'restore', id: input.part, version: input.version } as const;
    const restored = await applyChange(context, buildId, change);
    if (!restored) throw new NotFound('This part');
    return { id: restored.id, version: restored.version };
  },
);
