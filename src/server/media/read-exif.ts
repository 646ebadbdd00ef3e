/** What of a photo's EXIF is kept: its time, and nothing of place or device. */
export interface ExifTime {
  /** 2026-03-14T14:22:07 */
  readonly wallTime: string;
  /** +01:00 */
  readonly offset: string | null;
}

const EXIF_FOLDER = 0x8769;
const TAKEN_AT = 0x9003;
const TAKEN_OFFSET = 0x9011;
const TEXT = 2;
const LONG = 4;

/**
 * When a photo was taken (Exif 2.32, tags DateTimeOriginal and OffsetTimeOriginal); null when it does not say.
 * @param exif the block as a JPEG, PNG or WebP carries it
 */
export function readExifTime(exif: Buffer): ExifTime | null {
  try {
    const bytes = exif.toString('latin1', 0, 6) === 'Exif\0\0' ? exif.subarray(6) : exif;
    const little = bytes.toString('latin1', 0, 2) === 'II';
    if (!little && bytes.toString('latin1', 0, 2) !== 'MM') return null;
    const u16 = (at: number) => (little ? bytes.readUInt16LE(at) : bytes.readUInt16BE(at));
    const u32 = (at: number) => (little ? bytes.readUInt32LE(at) : bytes.readUInt32BE(at));

    const find = (folder: number, tag: number, type: number): number | null => {
      const count = u16(folder);
      for (let index = 0; index < count; index += 1) {
        const entry = folder + 2 + index * 12;
        if (u16(entry) === tag && u16(entry + 2) === type) return entry;
      }
      return null;
    };
    const text = (folder: number, tag: number): string | null => {
      const entry = find(folder, tag, TEXT);
      if (entry === null) return null;
      const length = u32(entry + 4);
      const at = length <= 4 ? entry + 8 : u32(entry + 8);
      return bytes
        .toString('latin1', at, at + length)
        .replace(/\0.*$/s, '')
        .trim();
    };

    const link = find(u32(4), EXIF_FOLDER, LONG);
    if (link === null) return null;
    const folder = u32(link + 8);
    const [, date, time] =
      /^(\d{4}:[01]\d:[0-3]\d) ([0-2]\d:[0-5]\d:[0-6]\d)$/.exec(text(folder, TAKEN_AT) ?? '') ?? [];
    if (date === undefined || time === undefined || date.startsWith('0000')) return null;
    const offset = text(folder, TAKEN_OFFSET);
    return {
      wallTime: `${date.replaceAll(':', '-')}T${time}`,
      offset: offset !== null && /^[+-]\d{2}:\d{2}$/.test(offset) ? offset : null,
    };
  } catch (error) {
    // An offset that points outside the block.
    if (error instanceof RangeError) return null;
    throw error;
  }
}
