import { z } from 'zod';
import { type Answer, right, wrong } from '../../domain/answer.ts';
import { type Chapter } from '../../domain/chapters/chapter.ts';
import { checkChapters } from '../../domain/chapters/check-chapters.ts';
import {
  CHAPTER_FORMS,
  type ChapterForm,
  toJsonChapters,
  writeChapterText,
  writeChapterVtt,
  writeFfmetadata,
  writePodloveChapters,
} from '../../domain/chapters/write-chapters.ts';
import { readCsv } from '../../domain/csv/read-csv.ts';
import { parseClock } from '../../domain/time/parse-clock.ts';
import { readArguments } from '../read-arguments.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE = 'chapters --to text|vtt|json|ffmetadata|podlove --length 848 chapters.csv';

const time = z.union([z.number(), z.string()]).transform(String);
const ChaptersRequest = z.object({
  to: z.enum(CHAPTER_FORMS, `Choose a form: ${CHAPTER_FORMS.join(', ')}.`),
  length: time.optional(),
  /** A list with the columns at and title, as text; or its rows. */
  chapters: z.union(
    [z.string(), z.array(z.union([z.object({ at: time, title: z.string() }), z.tuple([time, z.string()])]))],
    'Give the chapters as a list of at and title.',
  ),
});
type Asked = z.output<typeof ChaptersRequest>;
type Row = readonly [at: string, title: string];

function readMilliseconds(text: string): Answer<number> {
  const read = parseClock(text);
  return read.ok ? right(Math.round(read.value * 1000)) : read;
}

function readRows(chapters: Asked['chapters']): Answer<readonly Row[]> {
  if (typeof chapters !== 'string')
    return right(chapters.map((row) => (Array.isArray(row) ? row : [row.at, row.title])));
  const list = readCsv(chapters, ',');
  if (!list.ok) return list;
  const rows = list.value.rows.map(({ cells }) => cells);
  const headed = rows[0]?.[0]?.toLowerCase() === 'at';
  // A comma in a title is part of it, whether or not the cell was quoted.
  return right(rows.slice(headed ? 1 : 0).map(([at = '', ...title]) => [at, title.join(', ')]));
}

function readChapters(rows: readonly Row[]): Answer<readonly Chapter[]> {
  const chapters: Chapter[] = [];
  for (const [at, title] of rows) {
    const start = readMilliseconds(at);
    if (!start.ok) return start;
    chapters.push({ start: start.value, title });
  }
  return chapters.length === 0 ? wrong('There are no chapters in the list.') : right(chapters);
}

/** The first thing that makes the list wrong; for the text of a video host also what keeps it from being shown. */
function findFault(chapters: readonly Chapter[], length: number | null, to: ChapterForm): string | null {
  const faults = checkChapters(chapters, length);
  const stops = faults.find(
    ({ rule }) => to === 'text' || rule === 'order' || rule === 'title' || rule === 'end',
  );
  return stops?.sentence ?? null;
}

function write(chapters: readonly Chapter[], length: number | null, to: ChapterForm): Answer<unknown> {
  if (to === 'json') return right(toJsonChapters(chapters));
  if (to === 'text') return right({ text: writeChapterText(chapters) });
  if (to === 'podlove') return right({ text: writePodloveChapters(chapters) });
  if (length === null) return wrong('Give the length of the video: the last chapter ends with it.');
  return right({
    text: to === 'vtt' ? writeChapterVtt(chapters, length) : writeFfmetadata(chapters, length),
  });
}

/** Chapters in one of five forms. A command prints the document itself; a batch has it under text. */
export const chaptersTool: Tool = {
  usage: USAGE,
  fromArguments: (args, read) => {
    const found = readArguments(args, { to: { type: 'string' }, length: { type: 'string' } }, USAGE);
    if (!found.ok) return found;
    const [path, ...more] = found.value.bare;
    if (path === undefined || more.length > 0) return wrong(`Give one list of chapters. Usage: ${USAGE}`);
    const text = read(path);
    return text.ok ? right({ ...found.value.options, chapters: text.value }) : text;
  },
  run: (request) => {
    const asked = readRequest(ChaptersRequest, request);
    if (!asked.ok) return asked;
    const rows = readRows(asked.value.chapters);
    if (!rows.ok) return rows;
    const chapters = readChapters(rows.value);
    if (!chapters.ok) return chapters;
    const length = asked.value.length === undefined ? right(null) : readMilliseconds(asked.value.length);
    if (!length.ok) return length;
    const fault = findFault(chapters.value, length.value, asked.value.to);
    return fault === null ? write(chapters.value, length.value, asked.value.to) : wrong(fault);
  },
  print: (value) =>
    typeof value === 'object' && value !== null && 'text' in value
      ? String(value.text)
      : `${JSON.stringify(value)}\n`,
};
