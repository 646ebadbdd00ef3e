type UnicodeEncoding = 'utf-8' | 'utf-16le' | 'utf-16be';

/** The encodings that are read. windows-1252 is a guess, made when nothing else fits. */
export type TextEncoding = UnicodeEncoding | 'windows-1252';

export interface DecodedText {
  /** Without a byte order mark. */
  readonly text: string;
  readonly encoding: TextEncoding;
}

/**
 * Windows-1252 from 0x80 to 0x9F; the rest of it is Latin-1. Written out because decoders of some runtimes
 * take it for Latin-1 throughout. Source: WHATWG Encoding Standard, index windows-1252.
 */
const WINDOWS_1252 =
  '\u20ac\u0081\u201a\u0192\u201e\u2026\u2020\u2021\u02c6\u2030\u0160\u2039\u0152\u008d\u017d\u008f' +
  '\u0090\u2018\u2019\u201c\u201d\u2022\u2013\u2014\u02dc\u2122\u0161\u203a\u0153\u009d\u017e\u0178';

/**
 * The text of a file as people's programs save them: by its byte order mark, else UTF-16 where every second byte
 * is zero, else UTF-8 where it is valid, else Windows-1252.
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  const encoding = markOf(bytes) ?? zerosOf(bytes);
  if (encoding !== null) return { text: decodeAs(encoding, bytes), encoding };
  try {
    return { text: new TextDecoder('utf-8', { fatal: true }).decode(bytes), encoding: 'utf-8' };
  } catch {
    return { text: decodeWindows1252(bytes), encoding: 'windows-1252' };
  }
}

function markOf(bytes: Uint8Array): UnicodeEncoding | null {
  const [first, second, third] = bytes;
  if (first === 0xef && second === 0xbb && third === 0xbf) return 'utf-8';
  if (first === 0xff && second === 0xfe) return 'utf-16le';
  return first === 0xfe && second === 0xff ? 'utf-16be' : null;
}

/** UTF-16 without a mark: mostly Latin letters, so that nearly all bytes on one side are zero. */
function zerosOf(bytes: Uint8Array): UnicodeEncoding | null {
  const pairs = Math.min(200, Math.floor(bytes.length / 2));
  if (pairs < 4) return null;
  const zeros = [0, 1].map((side) => {
    let count = 0;
    for (let pair = 0; pair < pairs; pair += 1) if (bytes[2 * pair + side] === 0) count += 1;
    return count / pairs;
  });
  const [even = 0, odd = 0] = zeros;
  if (odd > 0.7 && even < 0.1) return 'utf-16le';
  return even > 0.7 && odd < 0.1 ? 'utf-16be' : null;
}

function decodeAs(encoding: UnicodeEncoding, bytes: Uint8Array): string {
  if (encoding !== 'utf-16be') return new TextDecoder(encoding).decode(bytes);
  // Swapped by hand: the browser knows utf-16be, small builds of the server's runtime do not.
  const swapped = new Uint8Array(bytes.length - (bytes.length % 2));
  for (let at = 0; at < swapped.length; at += 2) {
    swapped[at] = bytes[at + 1] ?? 0;
    swapped[at + 1] = bytes[at] ?? 0;
  }
  return new TextDecoder('utf-16le').decode(swapped);
}

function decodeWindows1252(bytes: Uint8Array): string {
  let text = '';
  for (const byte of bytes)
    text += byte >= 0x80 && byte < 0xa0 ? WINDOWS_1252.charAt(byte - 0x80) : String.fromCharCode(byte);
  return text;
}
