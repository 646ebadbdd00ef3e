import { and, eq, inArray, isNull } from 'drizzle-orm';
import { type Database } from '../../../db/client.ts';
import { files, fileVariants } from '../../../db/schema/files.ts';
import { parts } from '../../../db/schema/parts.ts';
import { readVideoAddress } from '../../../domain/video-addresses/read-video-address.ts';
import { type CompanionVideo, type KeptVideo } from '../companion.ts';
import { type Video } from '../episode.ts';

/** A video as its page needs it. */
export async function describeVideo(db: Database, video: Video): Promise<CompanionVideo> {
  const { seconds, rate } = video;
  if (video.fileId !== null) {
    return { kept: await describeFile(db, video.fileId), elsewhere: null, seconds, rate };
  }
  // It was read when it was stored: what only tests may keep has been let in there, or not at all.
  const address = readVideoAddress(video.address ?? '', { allowLoopback: true });
  if (!address.ok) throw new Error(`The stored address of video ${video.id} cannot be read.`);
  return { kept: null, elsewhere: address.value, seconds, rate };
}

async function describeFile(db: Database, id: string): Promise<KeptVideo> {
  const rows = await db
    .select({ variant: fileVariants.variant, width: fileVariants.width, height: fileVariants.height })
    .from(files)
    .innerJoin(fileVariants, eq(fileVariants.fileId, files.id))
    .where(and(eq(files.id, id), inArray(fileVariants.variant, ['video', 'poster'])));
  const rendition = rows.find(({ variant }) => variant === 'video');
  return {
    id,
    width: rendition?.width ?? null,
    height: rendition?.height ?? null,
    hasPoster: rows.some(({ variant }) => variant === 'poster'),
  };
}

/** Those of the parts named that stand in the list. */
export function loadShownParts(db: Database, workshopId: string, ids: readonly string[]) {
  if (ids.length === 0) return Promise.resolve([]);
  return db
    .select({
      id: parts.id,
      number: parts.number,
      name: parts.name,
      kind: parts.kind,
      quantity: parts.quantity,
      material: parts.material,
      size: parts.size,
      inPlans: parts.inPlans,
    })
    .from(parts)
    .where(and(eq(parts.workshopId, workshopId), inArray(parts.id, [...ids]), isNull(parts.deletedAt)));
}
