import { z } from 'zod';

/** A list as a file: its name, made of an address name so that it needs no quoting, and its text. */
export const CsvFile = z.object({ name: z.string(), text: z.string() });

/** Answers with a list to be kept as a file. */
export function replyWithCsv({ name, text }: z.output<typeof CsvFile>): Response {
  return new Response(text, {
    headers: {
      'content-type': 'text/csv; charset=utf-8',
      'content-disposition': `attachment; filename="${name}"`,
      'cache-control': 'private, no-store',
      'x-content-type-options': 'nosniff',
    },
  });
}
