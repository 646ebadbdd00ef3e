import { z } from 'zod';

/** A text to be kept as a file: its name, made so that it needs no quoting, its type and its words. */
export const TextFile = z.object({ name: z.string(), type: z.string(), text: z.string() });
export type TextFile = z.output<typeof TextFile>;

/** Answers with a file for whoever asked alone. */
export function replyWithText({ name, type, text }: TextFile): Response {
  return new Response(text, {
    headers: {
      'content-type': `${type}; charset=utf-8`,
      'content-disposition': `attachment; filename="${name}"`,
      'cache-control': 'private, no-store',
      'x-content-type-options': 'nosniff',
    },
  });
}
