/**
 * A JPEG without the segments that carry EXIF, XMP, IPTC and comments: APP1 to APP13 and COM, save APP2, which
 * holds the colour profile. What is no JPEG comes back as it is.
 */
export function stripJpeg(bytes: Uint8Array): Uint8Array {
  if (bytes[0] !== 0xff || bytes[1] !== 0xd8) return bytes;
  const kept: Uint8Array[] = [bytes.subarray(0, 2)];
  let at = 2;
  while (at + 4 <= bytes.length && bytes[at] === 0xff) {
    const marker = bytes[at + 1] ?? 0;
    // From the start of the picture on, nothing is a segment any more.
    if (marker === 0xda || marker === 0xd9) break;
    const length = 2 + (((bytes[at + 2] ?? 0) << 8) | (bytes[at + 3] ?? 0));
    const isNote = marker === 0xfe || (marker >= 0xe1 && marker <= 0xed && marker !== 0xe2);
    if (!isNote) kept.push(bytes.subarray(at, at + length));
    at += length;
  }
  kept.push(bytes.subarray(at));
  const result = new Uint8Array(kept.reduce((sum, piece) => sum + piece.length, 0));
  let offset = 0;
  for (const piece of kept) {
    result.set(piece, offset);
    offset += piece.length;
  }
  return result;
}
