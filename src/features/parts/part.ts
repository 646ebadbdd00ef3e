import { z } from 'zod';
import { PART_KINDS, type PartKind } from '../../domain/part-kinds.ts';
import { partNumber } from '../../domain/part-numbers.ts';
import { lineOfText } from '../../domain/plain-text.ts';
import { buildParams, buildVersion } from '../builds/build.ts';

export const PART_LENGTHS = { name: 120, material: 120, size: 120, aliases: 300, remark: 500 } as const;
export const MOST_NEEDED = 9999;
export const MOST_ALIASES = 20;
/** The parts that one build may have, and the changes that one request may carry. */
export const MOST_PARTS = 5000;
export const MOST_CHANGES = 500;

/** The columns of a parts list, in order. */
export const PART_FIELDS = [
  'number',
  'name',
  'kind',
  'quantity',
  'material',
  'size',
  'aliases',
  'inPlans',
  'remark',
] as const;
export type PartField = (typeof PART_FIELDS)[number];

export const PART_LABELS: Readonly<Record<PartField, string>> = {
  number: 'Number',
  name: 'Name',
  kind: 'Made or bought',
  quantity: 'Needed',
  material: 'Material',
  size: 'Size',
  aliases: 'Other names',
  inPlans: 'In the plans',
  remark: 'Remark',
};

/** A line that may be empty. Line breaks in a pasted cell become spaces. */
function optionalLine(length: number) {
  return z
    .string()
    .default('')
    .transform((text) => text.replace(/[\t\r\n]+/g, ' ').trim())
    .pipe(z.union([z.literal(''), lineOfText('', length)]));
}

const kind = z
  .string()
  .default('')
  .transform((text) => text.trim().toLowerCase())
  .transform((word) => (word === '' ? 'made' : PART_KINDS.find((one) => one === word || one[0] === word)))
  .pipe(z.enum(PART_KINDS, 'Enter made, bought or salvaged.'));

const NEEDED = `Enter how many are needed: a whole number from 1 to ${String(MOST_NEEDED)}.`;
const quantity = z
  .union([z.number(), z.string()], NEEDED)
  .default(1)
  .transform((value) =>
    typeof value === 'number'
      ? value
      : Number(/^\s*(\d*)(\s*needed)?\s*$/i.exec(value)?.[1] ?? Number.NaN) ||
        (value.trim() === '' ? 1 : Number.NaN),
  )
  .pipe(z.number(NEEDED).int(NEEDED).min(1, NEEDED).max(MOST_NEEDED, NEEDED));

const YES = ['', 'yes', 'y', 'true', 'on', '1', 'x', 'in the plans'];
const NO = ['no', 'n', 'false', 'off', '0', 'not in the plans'];
const inPlans = z
  .union([z.boolean(), z.string()])
  .default(true)
  .transform((value) => {
    if (typeof value === 'boolean') return value;
    const word = value.trim().toLowerCase();
    if (YES.includes(word)) return true;
    return NO.includes(word) ? false : undefined;
  })
  .pipe(z.boolean('Enter yes or no.'));

const aliases = z
  .union([z.array(z.string()), z.string()])
  .default([])
  .transform((value) => (typeof value === 'string' ? value.split(';') : value))
  .transform((words) => [...new Set(words.map((word) => word.trim()).filter((word) => word !== ''))])
  .pipe(
    z
      .array(lineOfText('', PART_LENGTHS.name))
      .max(MOST_ALIASES, `Keep it to ${String(MOST_ALIASES)} other names.`)
      .refine(
        (words) => words.join('; ').length <= PART_LENGTHS.aliases,
        `Keep the other names to ${String(PART_LENGTHS.aliases)} characters together.`,
      ),
  );

/** What a part says. Takes typed text and values alike: forms, the table, lists and scripts send the same. */
export const PartInput = z.object({
  number: partNumber,
  name: z
    .string('Enter a name.')
    .transform((text) => text.replace(/[\t\r\n]+/g, ' '))
    .pipe(lineOfText('Enter a name.', PART_LENGTHS.name)),
  kind,
  quantity,
  material: optionalLine(PART_LENGTHS.material),
  size: optionalLine(PART_LENGTHS.size),
  aliases,
  inPlans,
  remark: optionalLine(PART_LENGTHS.remark),
});

export interface PartFields {
  readonly number: string;
  readonly name: string;
  readonly kind: PartKind;
  readonly quantity: number;
  readonly material: string;
  readonly size: string;
  readonly aliases: readonly string[];
  readonly inPlans: boolean;
  readonly remark: string;
}

/** A part as pages, the table and other features know it. */
export interface Part extends PartFields {
  readonly id: string;
  readonly version: number;
}

const id = z.uuid('That is not an id of ours.');
export const partParams = buildParams.extend({ part: id });

export const ChangePartInput = PartInput.extend({ version: buildVersion });
export const PartVersionInput = z.object({ version: buildVersion });

/** One row's change, as the table sends it. A new row brings the id that the browser made. */
export const PartChange = z.discriminatedUnion('do', [
  z.object({ do: z.literal('add'), id, fields: PartInput }),
  z.object({ do: z.literal('change'), id, version: buildVersion, fields: PartInput }),
  z.object({ do: z.literal('delete'), id, version: buildVersion }),
  z.object({ do: z.literal('restore'), id, version: buildVersion }),
]);
export type PartChange = z.output<typeof PartChange>;

export const SavePartsInput = z.object({
  changes: z
    .array(PartChange)
    .min(1, 'There is nothing to save.')
    .max(MOST_CHANGES, `Send at most ${String(MOST_CHANGES)} changes at once.`),
});

export const PartAnswer = z.object({
  id,
  version: z.number(),
  number: z.string(),
  name: z.string(),
  kind: z.enum(PART_KINDS),
  quantity: z.number(),
  material: z.string(),
  size: z.string(),
  aliases: z.array(z.string()).readonly(),
  inPlans: z.boolean(),
  remark: z.string(),
});
export const SavedParts = z.object({ items: z.array(PartAnswer) });
export const PartsAnswer = z.object({ items: z.array(PartAnswer), nextCursor: z.null() });
