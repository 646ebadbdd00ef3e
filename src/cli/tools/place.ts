import Fraction from 'fraction.js';
import { z } from 'zod';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import { readCsv } from '../../domain/csv/read-csv.ts';
import { findByClipName } from '../../domain/edit/clip-names.ts';
import { type Edit, rateOf } from '../../domain/edit/edit.ts';
import { indexClipUses } from '../../domain/place/clip-uses.ts';
import { type ClipMoment, placeNotes } from '../../domain/place/place-notes.ts';
import { type Rate } from '../../domain/time/rate.ts';
import { hasDropFrame, parseTimecode } from '../../domain/time/timecode.ts';
import { readArguments } from '../read-arguments.ts';
import { editFields, readClipRates, readEditOf } from '../read-edit-request.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE = 'place --edit list.edl|timeline.otio --fps 25 [--clip-fps NAME=RATE] notes.csv';

const id = z.union([z.string(), z.number()]);
const PlaceRequest = z.object({
  ...editFields,
  /** A list with the columns id, clip and time, as text; or its rows. */
  notes: z.union(
    [z.string(), z.array(z.object({ id, clip: z.string(), time: z.union([z.string(), z.number()]) }))],
    'Give the notes as a list of id, clip and time.',
  ),
});
type Asked = z.output<typeof PlaceRequest>;

interface Row {
  readonly id: string | number;
  readonly clip: string;
  readonly time: string;
  /** How the row is called in a sentence. */
  readonly name: string;
}

function readRows(notes: Asked['notes']): Answer<readonly Row[]> {
  if (typeof notes !== 'string')
    return right(
      notes.map((note) => ({ ...note, time: String(note.time), name: `Note ${String(note.id)}` })),
    );
  const list = readCsv(notes);
  if (!list.ok) return list;
  const [head, ...rest] = list.value.rows;
  const headed = head?.cells.some((cell) => cell.toLowerCase() === 'time') === true;
  const names = headed ? head.cells.map((cell) => cell.toLowerCase()) : ['id', 'clip', 'time'];
  const columns = ['id', 'clip', 'time'].map((name) => names.indexOf(name));
  if (columns.includes(-1)) return wrong('The list of notes needs the columns id, clip and time.');
  const rows = headed || head === undefined ? rest : [head, ...rest];
  return right(
    rows.map(({ cells, line }) => {
      const [noteId = '', clip = '', time = ''] = columns.map((column) => cells[column] ?? '');
      return { id: noteId, clip, time, name: `Line ${String(line)}` };
    }),
  );
}

/** A time of a clip in seconds from its label 00:00:00:00. */
function readMoment(time: string, rate: Rate, drop: boolean): Answer<Fraction> {
  const typed = time.trim();
  if (/^\d{1,9}(?:\.\d{1,9})?$/.test(typed)) return right(new Fraction(typed));
  if (!typed.includes(':'))
    return wrong(`${typed === '' ? 'An empty text' : typed.slice(0, 40)} is no time.`);
  const read = parseTimecode(typed, rate, drop && hasDropFrame(rate) ? true : undefined);
  return read.ok ? right(new Fraction(read.value.frame).div(rateOf(rate))) : read;
}

function readMoments(
  rows: readonly Row[],
  edit: Edit,
  clipRates: ReadonlyMap<string, Rate>,
): Answer<ClipMoment[]> {
  const uses = indexClipUses([...edit.picture, ...edit.sound], edit.dissolved);
  const moments: ClipMoment[] = [];
  for (const { clip, time, name } of rows) {
    if (clip.trim() === '') return wrong(`${name}: the note has no clip.`);
    // The note of a clip that is not in the edit is lost; its time must be one all the same.
    const rate = findByClipName(clipRates, [clip]) ?? uses(clip)[0]?.segment.clipRate ?? edit.rate;
    const at = readMoment(time, rate, edit.drop);
    if (!at.ok) return wrong(`${name}: ${at.error}`);
    moments.push({ clip, at: at.value, sense: 'picture' });
  }
  return right(moments);
}

/** Where notes made on clips come in the episode, in seconds from its first event; the main place first. */
export const placeTool: Tool = {
  usage: USAGE,
  fromArguments: (args, read) => {
    const known = {
      edit: { type: 'string' },
      fps: { type: 'string' },
      'clip-fps': { type: 'string', multiple: true },
    } as const;
    const found = readArguments(args, known, USAGE);
    if (!found.ok) return found;
    const { edit: path, ...options } = found.value.options;
    const [list, ...more] = found.value.bare;
    if (typeof path !== 'string') return wrong(`Say which edit with --edit. Usage: ${USAGE}`);
    if (list === undefined || more.length > 0) return wrong(`Give one list of notes. Usage: ${USAGE}`);
    const edit = read(path);
    const notes = read(list);
    if (!edit.ok) return edit;
    return notes.ok ? right({ ...options, edl: edit.value, notes: notes.value }) : notes;
  },
  run: (request) => {
    const asked = readRequest(PlaceRequest, request);
    if (!asked.ok) return asked;
    const edit = readEditOf(asked.value);
    if (!edit.ok) return edit;
    const rows = readRows(asked.value.notes);
    if (!rows.ok) return rows;
    const clipRates = readClipRates(asked.value['clip-fps']);
    if (!clipRates.ok) return clipRates;
    const moments = readMoments(rows.value, edit.value, clipRates.value);
    if (!moments.ok) return moments;
    const rate = rateOf(edit.value.rate);
    const placed = placeNotes(edit.value, moments.value);
    return right({
      notes: rows.value.map((row, index) => {
        const { status, places } = placed[index] ?? { status: 'lost', places: [] };
        return { id: row.id, status, at: places.map(({ at }) => at.div(rate).valueOf()) };
      }),
    });
  },
};
