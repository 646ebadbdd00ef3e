import { onUniqueViolation } from '../../../server/constraint.ts';
import { verb } from '../../../server/verb.ts';
import { type ClipRef, loadClipAt } from './load-clip.ts';
import { setClip } from './set-clip.ts';

const TAKEN = { clips_file_unique: { '': 'Its file makes another clip by now, so it stays deleted.' } };

/** Brings a deleted clip back. @throws Conflict; Invalid when its file makes another clip by now */
export const restoreClip = verb(
  { may: 'footage.change' },
  async (context, input: ClipRef & { readonly version: number }) => {
    const stored = await loadClipAt(context, input, { deleted: true });
    return onUniqueViolation(TAKEN, () => setClip(context, stored, { deletedAt: null }));
  },
);
