import { sql } from 'drizzle-orm';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type ClipRef, loadClip, loadClipAt } from './load-clip.ts';
import { setClip } from './set-clip.ts';

type Join = ClipRef & { readonly before: string; readonly version: number };

/**
 * Joins a clip to the one that its camera split it from: it begins where that one ends.
 * @throws Invalid at `before` for another camera's clip, or one that goes on from this one; Conflict
 */
export const joinClip = verb({ may: 'footage.change' }, async (context, input: Join) => {
  const stored = await loadClipAt(context, input);
  const before = await loadClip(context, { build: input.build, clip: input.before }, { lock: true });
  if (before.id === stored.id || before.cameraId !== stored.cameraId)
    throw new Invalid({ before: 'Only clips of one camera are joined.' });
  const { rows } = await context.db.execute(sql`
    with recursive chain as (
      select id, continues_id from clips where id = ${before.id}
      union
      select clips.id, clips.continues_id from clips join chain on clips.id = chain.continues_id
    ) select from chain where id = ${stored.id}`);
  if (rows.length > 0) throw new Invalid({ before: 'That clip goes on from this one already.' });
  return setClip(context, stored, { continuesId: before.id });
});
