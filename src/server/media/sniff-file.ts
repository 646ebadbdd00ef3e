import { RefusedFile } from './refused-file.ts';
import { sniffText, type TextFormat } from './sniff-text.ts';

/** What a file is by its first bytes; whether it is whole is found out later. */
export type Sniffed =
  | { readonly kind: 'photo'; readonly format: 'jpeg' | 'png' | 'webp' | 'heic' }
  | { readonly kind: 'media'; readonly format: 'mov' | 'matroska' | 'wav' | 'mp3' }
  | { readonly kind: 'document'; readonly format: 'pdf' }
  | { readonly kind: 'text'; readonly format: TextFormat };

/** As many bytes from the beginning are enough to tell. */
export const SNIFF_BYTES = 64 * 1024;

const TAKEN =
  'Taken are photos (JPEG, PNG, WebP, HEIC), films (MP4, MOV, MKV, WebM), sound (WAV, MP3, M4A), PDF, and CSV, VTT, SRT, EDL or OTIO lists.';

/** ISO base media brands of still images coded with HEVC (ISO/IEC 23008-12). */
const HEIC_BRANDS = ['heic', 'heix', 'heim', 'heis', 'mif1'];
const OTHER_STILL_BRANDS = ['avif', 'avis', 'msf1', 'hevc'];
/** Boxes that a film without a type box begins with. */
const QUICKTIME_BOXES = ['moov', 'mdat', 'wide', 'free', 'skip', 'pnot'];

/**
 * Tells what a file is by its content.
 * @param head its first bytes, SNIFF_BYTES of them or all there are
 * @param name as the person has it: it chooses among texts, and nothing else
 * @throws RefusedFile for everything that is not taken
 */
export function sniffFile(head: Buffer, name: string): Sniffed {
  const starts = (text: string, at = 0) => head.toString('latin1', at, at + text.length) === text;
  if (head.length === 0) throw new RefusedFile('The file is empty. Look at it where it came from.');
  if (starts('\xff\xd8\xff')) return { kind: 'photo', format: 'jpeg' };
  if (starts('\x89PNG\r\n\x1a\n')) return { kind: 'photo', format: 'png' };
  if (starts('RIFF') && starts('WEBP', 8)) return { kind: 'photo', format: 'webp' };
  if ((starts('RIFF') || starts('RF64')) && starts('WAVE', 8)) return { kind: 'media', format: 'wav' };
  if (starts('\x1a\x45\xdf\xa3')) return { kind: 'media', format: 'matroska' };
  if (starts('%PDF-')) return { kind: 'document', format: 'pdf' };
  if (starts('ftyp', 4)) return sniffBrand(head.toString('latin1', 8, 12));
  if (QUICKTIME_BOXES.some((box) => starts(box, 4))) return { kind: 'media', format: 'mov' };
  if (starts('ID3') || isMp3Frame(head)) return { kind: 'media', format: 'mp3' };
  const text = sniffText(head, name);
  if (text !== null) return { kind: 'text', format: text };
  if (starts('GIF8') || starts('BM') || starts('II*\0') || starts('MM\0*'))
    throw new RefusedFile(
      `This kind of picture is not taken. Save it as JPEG or PNG and send that. ${TAKEN}`,
    );
  throw new RefusedFile(`This is no kind of file that is taken. ${TAKEN}`);
}

function sniffBrand(brand: string): Sniffed {
  if (HEIC_BRANDS.includes(brand)) return { kind: 'photo', format: 'heic' };
  if (OTHER_STILL_BRANDS.includes(brand))
    throw new RefusedFile(`This kind of picture is not taken. Save it as JPEG and send that. ${TAKEN}`);
  return { kind: 'media', format: 'mov' };
}

/** An MPEG audio frame, layer III: sync word, version, layer, and a bit rate and sampling rate that exist. */
function isMp3Frame(head: Buffer): boolean {
  if (head.length < 4) return false;
  const [first = 0, second = 0, third = 0] = head;
  const isSynced = first === 0xff && (second & 0xe0) === 0xe0;
  const hasVersion = (second & 0x18) !== 0x08;
  const isLayer3 = (second & 0x06) === 0x02;
  const hasRates = (third & 0xf0) !== 0xf0 && (third & 0xf0) !== 0 && (third & 0x0c) !== 0x0c;
  return isSynced && hasVersion && isLayer3 && hasRates;
}
