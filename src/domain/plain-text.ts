import { z } from 'zod';

/**
 * A line of text that a person types: trimmed, in NFC, without line breaks and invisible characters.
 * @param missing what to say when it is empty
 */
export function lineOfText(missing: string, length: number) {
  return z
    .string(missing)
    .trim()
    .normalize('NFC')
    .min(1, missing)
    .max(length, `Keep it to ${String(length)} characters.`)
    .refine(
      (line) => !/[\p{Cc}\p{Cf}\u2028\u2029]/u.test(line),
      'Leave out line breaks and invisible characters.',
    );
}

/** Running text that may be empty: line ends become \n, other control characters go. */
export function runningText(length: number) {
  return z
    .string()
    .default('')
    .transform((text) =>
      text
        .replace(/\r\n?/g, '\n')
        .replace(/[^\P{Cc}\n\t]/gu, '')
        .normalize('NFC')
        .trim(),
    )
    .pipe(z.string().max(length, `Keep it to ${String(length)} characters.`));
}
