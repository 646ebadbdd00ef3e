import { and, desc, eq, isNull } from 'drizzle-orm';
import { files } from '../../../db/schema/files.ts';
import { type WorkshopContext } from '../../../server/context.ts';

/** Photos to choose from; the newest of them. */
const MOST_CHOICES = 200;

/** The photos of a build that are ready to be shown, the newest first. */
export function loadPhotoChoices({ db, workshop }: WorkshopContext, buildId: string) {
  return db
    .select({ id: files.id, name: files.name, width: files.width, height: files.height })
    .from(files)
    .where(
      and(
        eq(files.workshopId, workshop.id),
        eq(files.buildId, buildId),
        eq(files.kind, 'photo'),
        eq(files.state, 'ready'),
        isNull(files.deletedAt),
      ),
    )
    .orderBy(desc(files.id))
    .limit(MOST_CHOICES);
}
