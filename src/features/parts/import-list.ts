import { z } from 'zod';
import { type Delimiter } from '../../domain/csv/read-csv.ts';
import { type ColumnChoice } from './import-columns.ts';
import { EXISTING_CHOICES, type ExistingChoice, type ImportRow } from './import-rows.ts';
import { MOST_PARTS, PART_FIELDS, type PartField } from './part.ts';

/** What a list may have. */
export const LIST_LIMITS = { bytes: 2 * 1024 * 1024, rows: MOST_PARTS } as const;

/** Read it; look it over with the columns chosen; take it. */
export const IMPORT_STEPS = ['read', 'look', 'take'] as const;

const column = z
  .union(
    [z.literal('').transform(() => undefined), z.coerce.number().int().min(0).max(200)],
    'Choose a column.',
  )
  .optional();

export const ImportListInput = z.object({
  step: z.enum(IMPORT_STEPS, 'Choose what to do with the list.').default('read'),
  /** A file as it was uploaded; the verb knows its form. */
  file: z.unknown().optional(),
  text: z.string('Paste the list as text.').default(''),
  encoding: z.string().max(20).default(''),
  headed: z.enum(['yes', 'no'], 'Choose whether the first row names the columns.').optional(),
  existing: z.enum(EXISTING_CHOICES, 'Choose what happens to numbers that are there.').default('leave'),
  ...(Object.fromEntries(PART_FIELDS.map((field) => [`column-${field}`, column])) as Record<
    `column-${PartField}`,
    typeof column
  >),
});
export type ImportList = z.output<typeof ImportListInput>;

/** A list on its way in, as its page shows it. */
export interface ImportView {
  readonly text: string;
  /** What the file was read as; empty for pasted text. */
  readonly encoding: string;
  readonly delimiter: Delimiter;
  readonly headed: boolean;
  /** A name for each column: its head, or a letter, with what stands first in it. */
  readonly columnNames: readonly string[];
  readonly columns: ColumnChoice;
  /** What is wrong with the columns, by field. */
  readonly columnErrors: Readonly<Partial<Record<PartField, string>>>;
  readonly existing: ExistingChoice;
  /** Null until the columns have been looked over. */
  readonly rows: readonly ImportRow[] | null;
  readonly problems: number;
  readonly adds: number;
  readonly updates: number;
}

export interface ImportResult {
  readonly taken: { readonly added: number; readonly updated: number } | null;
  readonly view: ImportView;
}

export const ImportAnswer = z.object({
  taken: z.object({ added: z.number(), updated: z.number() }).nullable(),
  view: z.object({
    columnErrors: z.record(z.string(), z.string()),
    problems: z.number(),
    adds: z.number(),
    updates: z.number(),
    rows: z
      .array(z.object({ line: z.number(), outcome: z.string(), problems: z.array(z.string()).readonly() }))
      .readonly()
      .nullable(),
  }),
});
