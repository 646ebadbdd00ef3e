import { decodeText } from '../../../domain/csv/decode-text.ts';
import { type CsvRow, readCsv } from '../../../domain/csv/read-csv.ts';
import { Invalid } from '../../../server/errors.ts';
import { UploadedFile } from '../../../server/http/uploaded-file.ts';
import { type ColumnChoice, looksHeaded, matchColumns, usualColumns } from '../import-columns.ts';
import { type ImportList, type ImportView, LIST_LIMITS } from '../import-list.ts';
import { PART_FIELDS, type PartField, PART_LABELS } from '../part.ts';

/** A list as far as it is known before its rows are held against the build. */
type ListView = Omit<ImportView, 'rows' | 'problems' | 'adds' | 'updates'>;

/**
 * Reads what was uploaded or pasted: its text, its rows, and which column holds what.
 * @throws Invalid at `file` or `text`
 */
export function readList(input: ImportList): { readonly list: ListView; readonly body: readonly CsvRow[] } {
  const { text, encoding, from } = textOf(input);
  const read = readCsv(text);
  if (!read.ok) throw new Invalid({ [from]: read.error });
  const { delimiter, rows } = read.value;
  const [first] = rows;
  if (!first) {
    throw new Invalid({ [from]: 'The list is empty. Choose a file or paste rows, the parts one a line.' });
  }
  const headed = input.headed === undefined ? looksHeaded(first.cells) : input.headed === 'yes';
  const body = headed ? rows.slice(1) : rows;
  if (body.length === 0) throw new Invalid({ [from]: 'The list has only its head. There is no part in it.' });
  if (body.length > LIST_LIMITS.rows) {
    throw new Invalid({
      [from]: `The list has ${body.length.toLocaleString('en-GB')} rows; at most ${LIST_LIMITS.rows.toLocaleString('en-GB')} are taken, which is also the most that a build may have. Nothing was taken.`,
    });
  }
  const width = Math.max(...rows.map(({ cells }) => cells.length));
  const columns = input.step === 'read' ? suggest(headed, first, width) : chosen(input, width);
  return {
    body,
    list: {
      text,
      encoding,
      delimiter,
      headed,
      columnNames: nameColumns(headed ? first.cells : [], body, width),
      columns,
      columnErrors: input.step === 'read' ? {} : findColumnErrors(columns),
      existing: input.existing,
    },
  };
}

function textOf(input: ImportList): { text: string; encoding: string; from: 'file' | 'text' } {
  if (!(input.file instanceof UploadedFile)) {
    if (Buffer.byteLength(input.text) > LIST_LIMITS.bytes)
      throw tooLong('text', Buffer.byteLength(input.text));
    return { text: input.text, encoding: input.encoding, from: 'text' };
  }
  const { bytes, name } = input.file;
  if (bytes.length > LIST_LIMITS.bytes) throw tooLong('file', bytes.length);
  if (bytes.length === 0)
    throw new Invalid({ file: `The file ${name.slice(0, 80)} is empty. Choose another.` });
  const decoded = decodeText(bytes);
  if (!decoded.ok) throw new Invalid({ file: decoded.error });
  return { ...decoded.value, from: 'file' };
}

function tooLong(field: 'file' | 'text', bytes: number): Invalid {
  const size = (bytes / 1024 / 1024).toFixed(1);
  return new Invalid({
    [field]: `The list is ${size} MiB long; lists up to 2 MiB are taken. Nothing was taken.`,
  });
}

function suggest(headed: boolean, first: CsvRow, width: number): ColumnChoice {
  return headed ? matchColumns(first.cells) : usualColumns(width);
}

function chosen(input: ImportList, width: number): ColumnChoice {
  const choice: Partial<Record<PartField, number>> = {};
  for (const field of PART_FIELDS) {
    const column = input[`column-${field}`];
    if (column !== undefined && column < width) choice[field] = column;
  }
  return choice;
}

function findColumnErrors(columns: ColumnChoice): Partial<Record<PartField, string>> {
  const errors: Partial<Record<PartField, string>> = {};
  if (columns.number === undefined) errors.number = 'Choose the column that holds the part numbers.';
  if (columns.name === undefined) errors.name = 'Choose the column that holds the names.';
  const holders = new Map<number, PartField>();
  for (const field of PART_FIELDS) {
    const column = columns[field];
    if (column === undefined) continue;
    const other = holders.get(column);
    if (other === undefined) holders.set(column, field);
    else
      errors[field] = `That column is chosen for “${PART_LABELS[other]}” already. Choose another, or none.`;
  }
  return errors;
}

function nameColumns(heads: readonly string[], body: readonly CsvRow[], width: number): string[] {
  return Array.from({ length: width }, (_, index) => {
    const head = heads[index] ?? '';
    const sample = body.map(({ cells }) => cells[index] ?? '').find((cell) => cell !== '') ?? '';
    const name = head === '' ? `Column ${String(index + 1)}` : head.slice(0, 40);
    return sample === '' ? name : `${name}: ${sample.slice(0, 30)} …`;
  });
}
