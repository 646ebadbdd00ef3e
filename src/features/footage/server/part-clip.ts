import { verb } from '../../../server/verb.ts';
import { type ClipRef, loadClipAt } from './load-clip.ts';
import { setClip } from './set-clip.ts';

/** Takes a clip apart from the one it was joined to: its own file says again when it began. @throws Conflict */
export const partClip = verb(
  { may: 'footage.change' },
  async (context, input: ClipRef & { readonly version: number }) =>
    setClip(context, await loadClipAt(context, input), { continuesId: null }),
);
