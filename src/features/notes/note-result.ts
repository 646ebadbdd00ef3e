import { z } from 'zod';
import { worksheetParams } from '../worksheets/worksheet.ts';

const id = z.uuid('That is not an id of ours.');
export const noteResultParams = worksheetParams.extend({ note: id });

/** Which of a worksheet's results a note carries. */
export const CarryResultInput = z.object({
  note: z.uuid('Choose a note.'),
  what: z.string('Choose a result.').min(1, 'Choose a result.').max(200, 'Choose a result.'),
});
export type CarryResult = z.output<typeof CarryResultInput>;

export const CarriedAnswer = z.object({ note: id });

/** A note that carries a result of a worksheet, beside what the worksheet says now. */
export interface CarryingNote {
  readonly note: string;
  readonly text: string;
  /** The episode at whose desk it was written; null for one made on a clip. */
  readonly episode: { readonly id: string; readonly number: number } | null;
  readonly what: string;
  readonly said: string;
  /** Null where the worksheet has no such result any more. */
  readonly now: string | null;
}

/** A result that viewers see with a note. */
export interface ShownResult {
  readonly what: string;
  readonly said: string;
  /** The worksheet, where others may see it. */
  readonly worksheet: { readonly id: string; readonly title: string } | null;
}
