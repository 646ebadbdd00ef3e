import { deflateRawSync, inflateRawSync } from 'node:zlib';
import { type Answer } from '../../../domain/answer.ts';
import { decodeText } from '../../../domain/csv/decode-text.ts';
import { type Edit } from '../../../domain/edit/edit.ts';
import { type WrittenSource } from '../../../domain/edit/edit-sources.ts';
import { clipNames } from '../../../domain/edit/clip-names.ts';
import { parseRate, type Rate } from '../../../domain/time/rate.ts';
import { Invalid } from '../../../server/errors.ts';
import { readEditApart } from '../../../server/edits/read-edit-apart.ts';
import { UploadedFile } from '../../../server/http/uploaded-file.ts';
import { EDIT_TEXT_BYTES, NO_RATE, type ReadEdit } from '../edit.ts';

/** The text of an edit as it came, with the form it has. */
export interface EditText {
  readonly text: string;
  readonly name: string;
  readonly source: WrittenSource;
}

/** The most that is believed, as in positions. */
const MOST_FRAMES = 864_000_000;
const [MOST_NUM, MOST_DEN] = [1_000_000, 10_000];

/** @throws Invalid at `file` when there is no text, or too much of it */
export function editTextOf(input: Pick<ReadEdit, 'file' | 'text' | 'packed' | 'name'>): EditText {
  const { text, name } = unwrap(input);
  if (text.trim() === '')
    throw new Invalid({ file: 'Choose the edit list or timeline that the editing program exported.' });
  if (Buffer.byteLength(text) > EDIT_TEXT_BYTES) throw tooLong(Buffer.byteLength(text));
  const source = /^\uFEFF?\s*[{[]/.test(text) ? 'timeline' : 'list';
  return { text, name: name === '' ? 'pasted text' : name, source };
}

function unwrap({ file, text, packed, name }: Pick<ReadEdit, 'file' | 'text' | 'packed' | 'name'>) {
  if (file instanceof UploadedFile) {
    if (file.bytes.length > EDIT_TEXT_BYTES) throw tooLong(file.bytes.length);
    const decoded = decodeText(file.bytes);
    if (!decoded.ok)
      throw new Invalid({
        file: 'That is not a text file. Choose the edit list (.edl) or the timeline (.otio) itself.',
      });
    return { text: decoded.value.text, name: file.name.slice(-200) };
  }
  return { text: packed === '' ? text : unpack(packed), name };
}

function tooLong(bytes: number): Invalid {
  const mebibytes = (number: number) => (number / 1024 / 1024).toFixed(1);
  return new Invalid({
    file: `The file has ${mebibytes(bytes)} MiB; up to ${mebibytes(EDIT_TEXT_BYTES)} MiB are taken. Nothing was taken.`,
  });
}

/** A text as a form carries it from the look at it to its taking: a tenth as long, its line ends as they are. */
export function packText(text: string): string {
  return deflateRawSync(Buffer.from(text)).toString('base64');
}

function unpack(packed: string): string {
  try {
    return inflateRawSync(Buffer.from(packed, 'base64'), { maxOutputLength: EDIT_TEXT_BYTES }).toString();
  } catch {
    throw new Invalid({ file: 'The edit did not come back whole. Choose the file again.' });
  }
}

/** The rates that were given to names of the edit, by their places in it. */
function clipRatesOf(edit: Edit, given: Readonly<Record<string, string>>): Map<string, Rate> {
  const rates = new Map<string, Rate>();
  for (const [index, name] of clipNames(edit).entries()) {
    const text = given[String(index)]?.trim() ?? '';
    if (text === '') continue;
    const read = parseRate(text);
    if (!read.ok) throw new Invalid({ [`clip-rate-${String(index)}`]: NO_RATE });
    rates.set(name, read.value);
  }
  return rates;
}

/**
 * Reads an edit's text at a rate, with the rates that were given to its clips.
 * @returns the edit, or a sentence; @throws Invalid for a rate that is none
 */
export async function readEditText(
  { text }: EditText,
  rate: Rate | null,
  clipRates: Readonly<Record<string, string>>,
): Promise<Answer<Edit>> {
  const read = await readEditApart(text, { rate });
  if (!read.ok) return read;
  // Names stand in the order of the edit, which is known once it has been read.
  const rates = clipRatesOf(read.value, clipRates);
  const again = rates.size === 0 ? read : await readEditApart(text, { rate, clipRates: rates });
  return again.ok ? requireKeepable(again.value) : again;
}

/** What cannot be kept, or believed, is refused before anyone looks at it. */
function requireKeepable(edit: Edit): Answer<Edit> {
  const { rate, frames } = edit;
  const no = (error: string): Answer<Edit> => ({ ok: false, error });
  if (frames.compare(MOST_FRAMES) > 0) return no('The edit is longer than ten days. Look at its times.');
  if (frames.compare(0) <= 0) return no('Nothing in the edit has a length.');
  const rates = [rate, ...[...edit.picture, ...edit.sound].map(({ clipRate }) => clipRate)];
  if (rates.some(({ num, den }) => num > MOST_NUM || den > MOST_DEN))
    return no('The edit counts in a rate that no film is counted in.');
  const words = [
    edit.title,
    ...clipNames(edit),
    ...edit.markers.flatMap(({ name, colour }) => [name, colour ?? '']),
    ...edit.picture.flatMap(({ alsoCalled }) => alsoCalled),
  ];
  const odd = words.find((word) => /[\0\p{Surrogate}]/u.test(word));
  if (odd === undefined) return { ok: true, value: edit };
  return no(
    `The name “${odd.replace(/[\0\p{Surrogate}]/gu, '?').slice(0, 60)}” has a character that cannot be kept.`,
  );
}
