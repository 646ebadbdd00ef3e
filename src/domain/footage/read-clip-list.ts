import { type CsvRow, readCsv } from '../csv/read-csv.ts';
import { type Rate } from '../time/rate.ts';
import { CLIP_COLUMNS, type ClipColumn, readClipRow } from './clip-list-row.ts';
import { type NamedClip } from './named-clip.ts';

/** The most rows of one list that are taken. Our own limit. */
export const MOST_LISTED_CLIPS = 5000;

/** What lists call their columns, in small letters. */
const HEADS: Readonly<Record<ClipColumn, readonly string[]>> = {
  name: ['name', 'clip', 'file', 'file name', 'filename', 'clip name'],
  camera: ['camera', 'cam', 'device'],
  filmed: ['filmed', 'created', 'creation', 'creation time', 'date', 'start', 'recorded'],
  length: ['length', 'duration', 'seconds'],
  rate: ['rate', 'fps', 'frame rate', 'framerate', 'frames per second'],
  timecode: ['timecode', 'tc', 'start timecode', 'start tc'],
  pace: ['pace', 'speed', 'time-lapse', 'timelapse'],
  stage: ['stage'],
  parts: ['parts', 'part'],
};

/** Something to be told about a line of a list, counted from 1; 0 about all of it. */
export interface LineProblem {
  readonly line: number;
  readonly text: string;
}

export interface ClipList {
  readonly clips: readonly { readonly line: number; readonly clip: NamedClip }[];
  readonly problems: readonly LineProblem[];
}

/**
 * Reads a list of clips. Its first row names the columns. What cannot be read is told by line, and the rest still read.
 * @param text as decoded
 * @param usual the rate of rows that do not say theirs
 */
export function readClipList(text: string, usual: Rate): ClipList {
  const { rows, problem } = readRows(text.replace(/\r\n?/g, '\n'));
  const problems: LineProblem[] = problem === null ? [] : [problem];
  const [head, ...body] = rows;
  if (head === undefined)
    return { clips: [], problems: [...problems, { line: 0, text: 'The list is empty.' }] };
  const columns = matchHeads(head);
  if (columns.name === undefined) {
    const text = `The first row has to name the columns, with “name” among them: ${CLIP_COLUMNS.join(', ')}. Nothing was taken.`;
    return { clips: [], problems: [...problems, { line: head.line, text }] };
  }
  const clips: { line: number; clip: NamedClip }[] = [];
  for (const row of body.slice(0, MOST_LISTED_CLIPS)) {
    const read = readClipRow(cellsOf(row, columns), usual);
    problems.push(...read.problems.map((text) => ({ line: row.line, text })));
    if (read.clip !== null) clips.push({ line: row.line, clip: read.clip });
  }
  const left = body[MOST_LISTED_CLIPS];
  if (left !== undefined) {
    const text = `At most ${MOST_LISTED_CLIPS.toLocaleString('en-GB')} clips of one list are taken: from here on they were left out. Send the rest as a second list, with the same first row.`;
    problems.push({ line: left.line, text });
  }
  return { clips, problems };
}

/** Rows; of a list that breaks off inside quotes, those before the row that does. */
function readRows(text: string): { rows: readonly CsvRow[]; problem: LineProblem | null } {
  // With the row of heads, and one more to know that there are more.
  const most = MOST_LISTED_CLIPS + 2;
  const read = readCsv(text, undefined, most);
  if (read.ok) return { rows: read.value.rows, problem: null };
  const lines = text.split('\n');
  const odd = lines.findLastIndex((line) => (line.split('"').length - 1) % 2 === 1);
  const before = odd === -1 ? null : readCsv(lines.slice(0, odd).join('\n'), undefined, most);
  if (before?.ok !== true) return { rows: [], problem: { line: 0, text: read.error } };
  const sentence =
    'The list breaks off inside quotes here: it may have been cut off. What stands before was read.';
  return { rows: before.value.rows, problem: { line: odd + 1, text: sentence } };
}

function matchHeads({ cells }: CsvRow): Partial<Record<ClipColumn, number>> {
  const heads = cells.map((cell) =>
    cell
      .toLowerCase()
      .replace(/[_\s]+/g, ' ')
      .trim(),
  );
  const found: Partial<Record<ClipColumn, number>> = {};
  for (const column of CLIP_COLUMNS) {
    const at = heads.findIndex((head) => HEADS[column].includes(head));
    if (at !== -1) found[column] = at;
  }
  return found;
}

function cellsOf({ cells }: CsvRow, columns: Partial<Record<ClipColumn, number>>) {
  return Object.fromEntries(
    Object.entries(columns).map(([column, at]) => [column, cells[at] ?? '']),
  ) as Partial<Record<ClipColumn, string>>;
}
