/** How a file's bytes were read. */
export type TextEncoding = 'UTF-8' | 'UTF-16' | 'Windows-1252';

export type DecodedText =
  | { readonly ok: true; readonly value: { readonly text: string; readonly encoding: TextEncoding } }
  | { readonly ok: false; readonly error: string };

/**
 * Reads a text file as spreadsheets write them: UTF-8 or UTF-16 with their marks, UTF-8 without, else Windows-1252.
 * @returns the text without its mark, and what it was read as; or a sentence, when it is no text
 */
export function decodeText(bytes: Uint8Array): DecodedText {
  if (startsWith(bytes, [0xef, 0xbb, 0xbf])) return decodeAs('utf-8', 'UTF-8', bytes);
  if (startsWith(bytes, [0xff, 0xfe])) return decodeAs('utf-16le', 'UTF-16', bytes);
  if (startsWith(bytes, [0xfe, 0xff])) return decodeAs('utf-16be', 'UTF-16', bytes);
  const wide = unmarkedUtf16(bytes);
  if (wide !== null) return decodeAs(wide, 'UTF-16', bytes);
  if (bytes.includes(0)) return notText();
  const utf8 = decodeAs('utf-8', 'UTF-8', bytes);
  return utf8.ok ? utf8 : decodeAs('windows-1252', 'Windows-1252', bytes);
}

function startsWith(bytes: Uint8Array, mark: readonly number[]): boolean {
  return mark.every((byte, index) => bytes[index] === byte);
}

/** In a list most characters are below 128: in UTF-16 every second byte of them is then zero. */
function unmarkedUtf16(bytes: Uint8Array): 'utf-16le' | 'utf-16be' | null {
  const seen = bytes.subarray(0, 400);
  if (seen.length < 4 || bytes.length % 2 !== 0) return null;
  const zeros = [0, 0];
  for (const [index, byte] of seen.entries()) if (byte === 0) zeros[index % 2] = (zeros[index % 2] ?? 0) + 1;
  const [even = 0, odd = 0] = zeros;
  const most = (seen.length / 2) * 0.8;
  if (odd >= most && even === 0) return 'utf-16le';
  return even >= most && odd === 0 ? 'utf-16be' : null;
}

function decodeAs(label: string, encoding: TextEncoding, bytes: Uint8Array): DecodedText {
  try {
    const text = new TextDecoder(label, { fatal: true }).decode(bytes);
    return text.includes('\0') ? notText() : { ok: true, value: { text, encoding } };
  } catch {
    return {
      ok: false,
      error: `The file says it is ${encoding}, but it is not whole or not that. Save it again as CSV in UTF-8.`,
    };
  }
}

function notText(): DecodedText {
  return { ok: false, error: 'That is not a text file. Save the list as CSV first, then choose that file.' };
}
