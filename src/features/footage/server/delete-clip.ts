import { sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { editClips } from '../../../db/schema/episodes.ts';
import { clips } from '../../../db/schema/footage.ts';
import { anchors, notes } from '../../../db/schema/notes.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { type ClipRef, loadClipAt } from './load-clip.ts';
import { setClip } from './set-clip.ts';

/** Deletes a clip that nothing stands on; for 30 days it can be brought back. @throws Invalid, Conflict */
export const deleteClip = verb(
  { may: 'footage.change' },
  async (context, input: ClipRef & { readonly version: number }) => {
    const stored = await loadClipAt(context, input);
    const user = await findUser(context.db, stored.id);
    if (user !== null) throw new Invalid({ '': `${user} this clip, so it stays. Nothing was changed.` });
    return setClip(context, stored, { deletedAt: context.now });
  },
);

async function findUser(db: Database, id: string): Promise<string | null> {
  const { rows } = await db.execute<{ user: string | null }>(sql`select case
    when exists (select from ${editClips} where ${editClips.clipId} = ${id}) then 'An edit uses'
    when exists (select from ${notes} join ${anchors} on ${anchors.id} = ${notes.anchorId}
      where ${id} in (${anchors.clipId}, ${anchors.endClipId}) and ${notes.deletedAt} is null) then 'Notes stand on'
    when exists (select from ${clips} where ${clips.continuesId} = ${id} and ${clips.deletedAt} is null)
      then 'Another clip goes on from'
  end as user`);
  return rows[0]?.user ?? null;
}
