import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { readCsv } from '../csv/read-csv.ts';
import { type Marker, rateOf } from '../edit/edit.ts';
import { readEdit } from '../edit/read-edit.ts';
import { NOTE_KINDS, type NoteKind } from '../note-kinds.ts';
import { type Rate } from '../time/rate.ts';
import { parseTimecode } from '../time/timecode.ts';

/** A mark as what it may become: a chapter, or a note of a kind about parts. */
export interface ReadMark {
  readonly as: 'note' | 'chapter';
  readonly kind: NoteKind;
  /** Numbers of the parts it names. */
  readonly parts: readonly string[];
  readonly text: string;
}

/** The words of a mark, as `markOfNote` writes them; anything else is a step in its own words. */
export function readMarkWords(name: string): ReadMark {
  const [, head = '', text = ''] = /^([^:\n]{1,200}): ([^]+)$/.exec(name.trim()) ?? [];
  const [word = '', ...rest] = head.split(' ');
  if (word === 'chapter' && rest.length === 0) return { as: 'chapter', kind: 'step', parts: [], text };
  const kind = NOTE_KINDS.find((one) => one === word);
  if (kind === undefined) return { as: 'note', kind: 'step', parts: [], text: name.trim() };
  const parts = rest
    .join(' ')
    .split(',')
    .map((number) => number.trim())
    .filter((number) => number !== '');
  return { as: 'note', kind, parts, text };
}

/**
 * The marks of a file: of an edit list or a timeline, or of a CSV as `writeMarksCsv` writes it.
 * @param rate of the episode
 * @returns the marks in frames of the episode; or a sentence, with the line where there is one
 */
export function readMarks(text: string, rate: Rate): Answer<readonly Marker[]> {
  if (/^\uFEFF?\s*[{[]/.test(text) || /^\s*(?:TITLE\s*:|FCM\s*:|\d{1,6}\s+\S+\s+\S+\s+[CDWK])/im.test(text)) {
    const read = readEdit(text, { rate });
    return read.ok ? right(read.value.markers) : read;
  }
  const csv = readCsv(text);
  if (!csv.ok) return csv;
  const [head, ...rows] = csv.value.rows;
  const column = (name: string) => head?.cells.findIndex((cell) => cell.toLowerCase() === name) ?? -1;
  const [timecode, seconds, words, colour] = ['timecode', 'seconds', 'text', 'colour'].map(column) as [
    number,
    number,
    number,
    number,
  ];
  if (words === -1 || (timecode === -1 && seconds === -1))
    return wrong('The list needs a column “text”, and one “timecode” or “seconds”.');
  const marks: Marker[] = [];
  for (const { line, cells } of rows) {
    const at = readAt(cells[timecode]?.trim() ?? '', cells[seconds]?.trim() ?? '', rate);
    if (!at.ok) return wrong(`Line ${String(line)}: ${at.error}`);
    const ink = cells[colour]?.trim() ?? '';
    marks.push({ record: at.value, name: cells[words] ?? '', colour: ink === '' ? null : ink.toUpperCase() });
  }
  return right(marks);
}

function readAt(timecode: string, seconds: string, rate: Rate): Answer<Fraction> {
  if (timecode !== '') {
    const read = parseTimecode(timecode, rate);
    return read.ok ? right(new Fraction(read.value.frame)) : read;
  }
  if (/^\d{1,6}(?:\.\d{1,6})?$/.test(seconds)) return right(new Fraction(seconds).mul(rateOf(rate)).floor());
  return wrong('There is no time that can be read.');
}
