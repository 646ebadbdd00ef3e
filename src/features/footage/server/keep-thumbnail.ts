import { clipThumbnails } from '../../../db/schema/footage.ts';
import { Invalid } from '../../../server/errors.ts';
import { makeSmallPicture } from '../../../server/media/small-picture.ts';
import { verb } from '../../../server/verb.ts';
import { THUMBNAIL_BYTES } from '../footage.ts';
import { type ClipRef, loadClip } from './load-clip.ts';

/** A thumbnail's longest side, in pixels. */
const SIDE = 320;

/** Keeps a small picture of a clip, made anew so that it holds nothing but the picture. @throws Invalid at `jpeg` */
export const keepThumbnail = verb(
  { may: 'footage.change' },
  async (context, input: ClipRef & { readonly jpeg: string }) => {
    const { db, workshop } = context;
    const clip = await loadClip(context, input);
    const jpeg = await makeSmallPicture(Buffer.from(input.jpeg, 'base64'), SIDE);
    if (jpeg === null || jpeg.byteLength > THUMBNAIL_BYTES * 2)
      throw new Invalid({ jpeg: 'That is no small picture. The clip was kept without one.' });
    await db
      .insert(clipThumbnails)
      .values({ workshopId: workshop.id, clipId: clip.id, jpeg })
      .onConflictDoUpdate({ target: clipThumbnails.clipId, set: { jpeg } });
    return { id: clip.id };
  },
);
