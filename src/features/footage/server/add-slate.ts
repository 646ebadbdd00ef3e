import { newId } from '../../../db/columns.ts';
import { slates } from '../../../db/schema/footage.ts';
import { parseClock } from '../../../domain/time/parse-clock.ts';
import { MILLISECOND_RATE, sameRate } from '../../../domain/time/rate.ts';
import { secondsToFrame } from '../../../domain/time/frames.ts';
import { instantOfWall } from '../../../domain/time/wall-time.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type AddSlate } from '../footage.ts';
import { announceTimes } from './announce-footage.ts';
import { type ClipRef, loadClip, type StoredClip } from './load-clip.ts';

/**
 * Keeps a clock slate that was read in a clip; every clip of its camera is timed anew.
 * @throws Invalid at `moment` for a moment outside of the clip, at `shows` for what is no time of the shop
 */
export const addSlate = verb({ may: 'footage.change' }, async (context, input: AddSlate & ClipRef) => {
  const { db, workshop } = context;
  const clip = await loadClip(context, input);
  const frame = input.frame ?? frameAt(clip, input.moment);
  if (clip.frames !== null && frame >= clip.frames)
    throw new Invalid({ moment: 'That is after the end of the clip.' });
  const shopMs = input.shopMs ?? instantOfWall(workshop.timeZone, input.shows);
  if (shopMs === null) throw new Invalid({ shows: 'Write what the slate shows: 2026-11-02 14:22:07.4.' });
  const id = newId();
  await db.insert(slates).values({
    id,
    workshopId: workshop.id,
    clipId: clip.id,
    frame,
    shopAt: new Date(shopMs),
    readBy: input.readBy,
  });
  await announceTimes(context, clip);
  return { id };
});

function frameAt({ rateNum, rateDen, frameTimes }: StoredClip, text: string): number {
  const seconds = parseClock(text);
  if (!seconds.ok) throw new Invalid({ moment: `The moment of the clip: ${seconds.error}` });
  if (frameTimes === null) return secondsToFrame(seconds.value, { num: rateNum, den: rateDen });
  const shown = Math.max(
    0,
    frameTimes.findLastIndex((begins) => begins <= seconds.value * 1000),
  );
  const counted = { num: rateNum, den: rateDen };
  return sameRate(counted, MILLISECOND_RATE) ? Math.round(frameTimes[shown] ?? 0) : shown;
}
