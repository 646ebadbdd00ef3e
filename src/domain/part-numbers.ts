import { z } from 'zod';
import { PART_NUMBER_LENGTH } from './part-kinds.ts';

/** A part number as typed: trimmed, in NFC, without slashes, line breaks and invisible characters. */
export const partNumber = z
  .string('Enter a number.')
  .trim()
  .normalize('NFC')
  .min(1, 'Enter a number.')
  .refine(
    (number) => [...number].length <= PART_NUMBER_LENGTH,
    `Keep the number to ${String(PART_NUMBER_LENGTH)} characters.`,
  )
  .refine((number) => !/[/\\]/.test(number), 'Leave the slash out of the number: A/2 could be A-2.')
  .refine(
    (number) => !/[\p{Cc}\p{Cf}\u2028\u2029]/u.test(number),
    'Leave out line breaks and invisible characters.',
  );

/** What two numbers of one build must not share: `k03` and `K03` are one number, `A-2` and `A2` are two. */
export function partNumberKey(number: string): string {
  return number.trim().normalize('NFC').toLowerCase();
}

const collator = new Intl.Collator('und', { numeric: true });

/** Orders part numbers as the database's collation `part_numbers` does: 9 before 10, A2 before A10. */
export function comparePartNumbers(a: string, b: string): number {
  // Numbers that the collation takes for equal still need one order: by code point, as the database breaks ties.
  return collator.compare(a, b) || (a < b ? -1 : a > b ? 1 : 0);
}
