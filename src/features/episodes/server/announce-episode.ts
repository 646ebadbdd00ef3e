import { type episodes } from '../../../db/schema/episodes.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { announcePageChanges } from '../../../server/http/page-changes.ts';

/** Tells every public page that shows this episode that it changed: its own, its build's, the workshop's, the front door. */
export async function announceEpisode(
  { db, workshop }: WorkshopContext,
  episode: Pick<typeof episodes.$inferSelect, 'id' | 'buildId'>,
): Promise<void> {
  await announcePageChanges(db, [
    'workshops',
    `workshop:${workshop.id}`,
    `build:${episode.buildId}`,
    `episode:${episode.id}`,
  ]);
}
