import { eq, sql } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { files } from '../../../db/schema/files.ts';
import { clips } from '../../../db/schema/footage.ts';
import { diaryPhotos } from '../../../db/schema/diary.ts';
import { videos } from '../../../db/schema/episodes.ts';
import { Invalid } from '../../../server/errors.ts';
import { verb } from '../../../server/verb.ts';
import { DELETED_DAYS } from '../file.ts';
import { type FileAddress, loadFile } from './load-file.ts';

/** Takes a file away; it can be brought back for 30 days. @throws Invalid while something shows it */
export const deleteFile = verb({ may: 'footage.change' }, async (context, input: FileAddress) => {
  const { db, now } = context;
  const file = await loadFile(context, input, { lock: true });
  if (file.state === 'uploading')
    throw new Invalid({ '': 'This file is still being sent. Stop the upload instead.' });
  const user = await findUser(db, file.id);
  if (user !== null) {
    throw new Invalid({
      '': `${user} uses this file, so it stays. Take it out there first; the original alone can go on the storage page.`,
    });
  }
  await db.update(files).set({ deletedAt: now, updatedAt: now }).where(eq(files.id, file.id));
  return { id: file.id, days: DELETED_DAYS };
});

async function findUser(db: Database, id: string): Promise<string | null> {
  const { rows } = await db.execute<{ user: string | null }>(sql`select case
    when exists (select from ${videos} where ${videos.fileId} = ${id}) then 'An episode'
    when exists (select from ${clips} where ${clips.fileId} = ${id} and ${clips.deletedAt} is null) then 'A clip'
    when exists (select from ${diaryPhotos} where ${diaryPhotos.fileId} = ${id}) then 'The diary'
  end as user`);
  return rows[0]?.user ?? null;
}
