import { z } from 'zod';
import { NOTE_KINDS, type NoteKind } from '../../domain/note-kinds.ts';

/** How many marks are taken at once. */
export const MOST_MARKS = 500;

/** A mark that is offered as a note or a chapter. */
export interface OfferedMark {
  /** Frames of the episode at the newest edit's rate. */
  readonly frame: number;
  /** The same as an editor reads it. */
  readonly label: string;
  readonly as: 'note' | 'chapter';
  readonly kind: NoteKind;
  readonly parts: readonly string[];
  readonly text: string;
  /** A note or chapter of these words is there already. */
  readonly there: boolean;
}

export const ReadMarksInput = z.object({ file: z.unknown().optional() });
export const OfferedMarks = z.object({
  marks: z
    .array(z.object({ frame: z.number(), label: z.string(), as: z.string(), text: z.string() }))
    .readonly(),
});

const row = z.object({
  as: z.enum(['leave', 'note', 'chapter'], 'Choose what becomes of each mark.'),
  frame: z.coerce.number().int().min(0).max(864_000_000),
  kind: z.enum(NOTE_KINDS).default('step'),
  parts: z.string().max(500).default(''),
  text: z.string().trim().max(2000).default(''),
});

/** Marks to be taken, each in fields that end in its number: `as-0`, `frame-0`, `kind-0`, `parts-0`, `text-0`. */
export const TakeMarksInput = z.looseObject({}).transform((values, context) => {
  const rows: z.output<typeof row>[] = [];
  for (let index = 0; index < MOST_MARKS && values[`as-${String(index)}`] !== undefined; index += 1) {
    const field = (name: string) => values[`${name}-${String(index)}`];
    const read = row.safeParse({
      as: field('as'),
      frame: field('frame'),
      kind: field('kind'),
      parts: field('parts'),
      text: field('text'),
    });
    if (read.success) rows.push(read.data);
    else
      context.addIssue({
        code: 'custom',
        path: [''],
        message: 'A mark did not come back whole. Read the file again.',
      });
  }
  if (!rows.some(({ as }) => as !== 'leave'))
    context.addIssue({ code: 'custom', path: [''], message: 'Choose at least one mark to take.' });
  return { rows };
});
export type TakeMarks = z.output<typeof TakeMarksInput>;

export const TakenMarks = z.object({ notes: z.number(), chapters: z.number() });
