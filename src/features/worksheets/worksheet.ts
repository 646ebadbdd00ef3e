import { z } from 'zod';
import { lineOfText } from '../../domain/plain-text.ts';
import { buildParams, buildVersion } from '../builds/build.ts';

/** Those that anyone may fill in, and that are kept with a build. */
const KEPT_AND_OPEN = {
  lengths: {
    title: 'Lengths',
    about: 'mm, inches, fractions, thou and feet, and the nearest mark of a rule.',
  },
  holes: { title: 'Holes', about: 'Tapping and clearance drills, and holes for split pins.' },
  fits: {
    title: 'Limits and fits',
    about: 'Shaft and hole by ISO 286, the clearance, and what is still to come off.',
  },
  seats: { title: 'Bearing seats', about: 'The seats of a bearing, by which ring turns under the load.' },
  sections: { title: 'Section mass', about: 'What a bar, tube or angle weighs by the metre.' },
  ports: {
    title: 'Ports',
    about: 'Which thread a port has, how it seals, and what it must never be mated with.',
  },
  drive: { title: 'Drives and speeds', about: 'Pulleys, belts, gears, and the speed for cutting.' },
  square: {
    title: 'Square and angle',
    about: 'An angle from offset and length, and a frame by its diagonals.',
  },
} as const;

/** Those that anyone may fill in. */
export const OPEN_SHEETS = {
  ...KEPT_AND_OPEN,
  stock: {
    title: 'Cutting plan',
    about: 'The fewest bars for a list of pieces, offcuts first, with marks for the tape.',
  },
} as const;

/** Those that are kept with a build. The last only a team fills in: others see its inputs and working. */
export const SHEETS = {
  ...KEPT_AND_OPEN,
  ram: { title: 'Hydraulic ram', about: 'Force, speed, power and oil of a cylinder and its pump.' },
  weld: {
    title: 'Stick welding',
    about: 'Current, throat, electrodes, heat, and the least leg against cracking.',
  },
  beam: { title: 'Simple beam', about: 'Stress and deflection, where the method holds.' },
} as const;
export type SheetId = keyof typeof SHEETS;
const SHEET_IDS = Object.keys(SHEETS) as [SheetId, ...SheetId[]];

/** Whether a word names one of the worksheets. */
export function isSheetId(word: string): word is SheetId {
  return Object.hasOwn(SHEETS, word);
}

export const WORKSHEET_TITLE_LENGTH = 120;
const MOST_INPUTS = 30;
const INPUT_LENGTH = 200;

const id = z.uuid('That is not an id of ours.');
export const worksheetParams = buildParams.extend({ worksheet: id });

/** What a worksheet may belong to within its build. */
export const OWNER_KINDS = ['stage', 'part', 'entry', 'episode'] as const;
export type OwnerKind = (typeof OWNER_KINDS)[number];

/** What it belongs to, as one word: nothing for the build itself, or a kind and an id. */
const belongsTo = z
  .string()
  .default('')
  .transform((word, context) => {
    if (word === '') return null;
    const [, kind, owner] = /^(stage|part|entry|episode):([\da-f-]{36})$/.exec(word) ?? [];
    if (kind !== undefined && z.uuid().safeParse(owner).success)
      return { kind: kind as OwnerKind, id: owner ?? '' };
    context.addIssue({ code: 'custom', message: 'Choose what it belongs to.' });
    return z.NEVER;
  });

const fields = {
  sheet: z.enum(SHEET_IDS, 'Choose a worksheet.'),
  title: lineOfText('Give it a name, such as what it is for.', WORKSHEET_TITLE_LENGTH),
  inputs: z
    .record(z.string().max(40), z.string().max(INPUT_LENGTH, 'An input takes at most 200 characters.'))
    .refine((inputs) => Object.keys(inputs).length <= MOST_INPUTS, 'A worksheet has fewer inputs.')
    .default({}),
  of: belongsTo,
  visibility: z.enum(['private', 'public'], 'Choose who may see it.').default('private'),
};

const OWN = new Set(['title', 'sheet', 'of', 'visibility', 'version', 'inputs']);

/** In a plain form each input of the sheet is a field of its own. */
function gatherInputs(values: unknown): unknown {
  if (typeof values !== 'object' || values === null || 'inputs' in values) return values;
  const given = Object.entries(values).filter(([name]) => !OWN.has(name));
  return { ...values, inputs: Object.fromEntries(given) };
}

export const AddWorksheetInput = z.preprocess(gatherInputs, z.object(fields));
export type AddWorksheet = z.output<typeof AddWorksheetInput>;
export const ChangeWorksheetInput = z.preprocess(
  gatherInputs,
  z.object({ ...fields, version: buildVersion }),
);
export type ChangeWorksheet = z.output<typeof ChangeWorksheetInput>;
export const WorksheetVersionInput = z.object({ version: buildVersion });

/** A worksheet as it is kept with a build. */
export interface KeptWorksheet {
  readonly id: string;
  readonly sheet: SheetId;
  readonly title: string;
  readonly inputs: Readonly<Record<string, string>>;
  /** Null for the build itself. */
  readonly of: { readonly kind: OwnerKind; readonly id: string; readonly name: string } | null;
  readonly visibility: 'private' | 'public';
  readonly version: number;
}
