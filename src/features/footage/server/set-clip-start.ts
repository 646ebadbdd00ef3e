import { instantOfWall } from '../../../domain/time/wall-time.ts';
import { shopTimeAt } from '../../../domain/footage/camera-clock.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type SetStart } from '../footage.ts';
import { type ClipRef, loadClipAt } from './load-clip.ts';
import { loadFilmedClips } from './load-filmed-clips.ts';
import { setClip } from './set-clip.ts';

/**
 * Sets when a clip began by hand, at a wall time of the shop; or nudges it by seconds from where it stands. With
 * neither it goes back to what its camera says.
 * @throws Conflict; Invalid at `at` or `by`
 */
export const setClipStart = verb({ may: 'footage.change' }, async (context, input: SetStart & ClipRef) => {
  const { db, workshop, now } = context;
  const stored = await loadClipAt(context, input);
  if (input.at !== '') {
    const at = instantOfWall(workshop.timeZone, input.at);
    if (at === null)
      throw new Invalid({
        at: 'That is no time. Write it as 2026-11-02 14:22:07, as the shop’s clock showed it.',
      });
    return setClip(context, stored, { startSetAt: new Date(at + input.by * 1000) });
  }
  if (input.by === 0) return setClip(context, stored, { startSetAt: null });
  const timed = (await loadFilmedClips(db, stored.buildId, now)).find(({ id }) => id === stored.id);
  if (timed?.start == null)
    throw new Invalid({ by: 'Nothing says when this clip began, so it cannot be nudged. Write its start.' });
  const began = shopTimeAt(timed.clock, timed.start).valueOf();
  return setClip(context, stored, { startSetAt: new Date(Math.round(began + input.by * 1000)) });
});
