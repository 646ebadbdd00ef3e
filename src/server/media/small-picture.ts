import sharp from 'sharp';

/**
 * A small JPEG of a picture that a browser made, drawn anew so that it holds nothing but the picture.
 * @param side the longest side, in pixels
 * @returns null for what is no picture, or a large one
 */
export async function makeSmallPicture(bytes: Uint8Array, side: number): Promise<Uint8Array | null> {
  if (bytes.byteLength === 0) return null;
  return sharp(bytes, { limitInputPixels: 1_000_000 })
    .resize(side, side, { fit: 'inside', withoutEnlargement: true })
    .jpeg({ quality: 70 })
    .toBuffer()
    .catch(() => null);
}
