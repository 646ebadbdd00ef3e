import { and, eq, inArray, isNull } from 'drizzle-orm';
import { diaryPhotos } from '../../../db/schema/diary.ts';
import { files } from '../../../db/schema/files.ts';
import { type WorkshopContext } from '../../../server/context.ts';
import { Invalid } from '../../../server/errors.ts';
import { type AddEntry } from '../diary.ts';

/** Makes an entry show these photos, in this order. @throws Invalid at `photos` for one that is not of the build */
export async function writePhotos(
  { db, workshop }: WorkshopContext,
  entry: { readonly id: string; readonly buildId: string },
  photos: AddEntry['photos'],
): Promise<void> {
  await db.delete(diaryPhotos).where(eq(diaryPhotos.entryId, entry.id));
  const wanted = [...new Map(photos.map((photo) => [photo.file, photo])).values()];
  if (wanted.length === 0) return;
  const found = await db
    .select({ id: files.id })
    .from(files)
    .where(
      and(
        inArray(
          files.id,
          wanted.map(({ file }) => file),
        ),
        eq(files.workshopId, workshop.id),
        eq(files.buildId, entry.buildId),
        eq(files.kind, 'photo'),
        eq(files.state, 'ready'),
        isNull(files.deletedAt),
      ),
    );
  if (found.length !== wanted.length) {
    throw new Invalid({ photos: 'A photo that was chosen is not here any more. Choose the photos again.' });
  }
  await db.insert(diaryPhotos).values(
    wanted.map(({ file, description }, index) => ({
      workshopId: workshop.id,
      entryId: entry.id,
      fileId: file,
      position: index + 1,
      description,
    })),
  );
}
