import { announcePageChanges } from '../../../server/http/page-changes.ts';
import { type JobHandler } from '../../../server/jobs/queue.ts';
import { listReadEdits, placeEdit } from '../../notes/server/place-edit.ts';

/**
 * Places everything again in the edits of a build that pages read, because its footage, or when it was made, is known
 * otherwise now. Each edit is one transaction: nobody sees half of it.
 */
export const placeFootage: JobHandler = async ({ db }, { build }) => {
  if (build === undefined) return;
  for (const { id, episodeId, shown } of await listReadEdits(db, build)) {
    await db.transaction(async (transaction) => {
      await placeEdit(transaction, id);
      if (shown) await announcePageChanges(transaction, [`episode:${episodeId}`]);
    });
  }
};
