import { type FileHandle, open } from 'node:fs/promises';

const CUT_OFF =
  'The file was cut off: its end is missing. Copy it from the card again and send that; if it is so on the card, the camera did not close it.';

/**
 * Why a film or sound is not whole, or null when nothing speaks against it: what its own headers say it holds is
 * compared with its length.
 * @param format as sniffed
 */
export async function findCutOff(
  path: string,
  format: 'mov' | 'matroska' | 'wav' | 'mp3',
): Promise<string | null> {
  const file = await open(path, 'r');
  try {
    const { size } = await file.stat();
    if (format === 'mov') return await walkBoxes(file, size);
    if (format === 'wav') return await checkRiff(file, size);
    if (format === 'matroska') return await checkSegment(file, size);
    return null;
  } finally {
    await file.close();
  }
}

async function readAt(file: FileHandle, at: number, length: number): Promise<Buffer> {
  const { buffer, bytesRead } = await file.read(Buffer.alloc(length), 0, length, at);
  return buffer.subarray(0, bytesRead);
}

/** The boxes of ISO base media stand one after the other up to the end (ISO/IEC 14496-12, section 4.2). */
async function walkBoxes(file: FileHandle, size: number): Promise<string | null> {
  let hasIndex = false;
  for (let at = 0, boxes = 0; at < size; boxes += 1) {
    const head = await readAt(file, at, 16);
    // Some cameras pad the end; a bound keeps a hostile file from being walked for hours.
    if (head.length < 8 || boxes > 200_000) break;
    const type = head.toString('latin1', 4, 8);
    const short = head.readUInt32BE(0);
    if (short === 0 && type === '\0\0\0\0') break;
    const length =
      short === 1 && head.length === 16 ? Number(head.readBigUInt64BE(8)) : short === 0 ? size - at : short;
    if (length < 8 || at + length > size) return CUT_OFF;
    if (type === 'moov') hasIndex = true;
    at += length;
  }
  return hasIndex ? null : CUT_OFF;
}

/** Recorders that were switched off leave 0 or the largest number, which says nothing. */
async function checkRiff(file: FileHandle, size: number): Promise<string | null> {
  const head = await readAt(file, 0, 12);
  const announced = head.readUInt32LE(4);
  if (announced === 0 || announced === 0xffffffff) return null;
  return announced + 8 > size + 1 ? CUT_OFF : null;
}

/** The Segment's size, when it is known, follows the EBML header (RFC 8794, section 6; RFC 9559, section 5). */
async function checkSegment(file: FileHandle, size: number): Promise<string | null> {
  const head = await readAt(file, 0, 4096);
  const header = readVint(head, 4);
  if (header === null) return CUT_OFF;
  const segmentAt = header.end + header.value;
  if (segmentAt + 12 > head.length) return null;
  if (head.readUInt32BE(segmentAt) !== 0x18538067) return null;
  const segment = readVint(head, segmentAt + 4);
  if (segment === null || segment.unknown) return null;
  return segment.end + segment.value > size ? CUT_OFF : null;
}

function readVint(bytes: Buffer, at: number): { value: number; end: number; unknown: boolean } | null {
  const first = bytes[at];
  if (first === undefined || first === 0) return null;
  const length = Math.clz32(first) - 23;
  let value = BigInt(first & (0xff >> length));
  let ones = value === BigInt(0xff >> length);
  for (let index = 1; index < length; index += 1) {
    const next = bytes[at + index];
    if (next === undefined) return null;
    if (next !== 0xff) ones = false;
    value = value * 256n + BigInt(next);
  }
  return { value: Number(value), end: at + length, unknown: ones };
}
