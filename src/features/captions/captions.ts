import { z } from 'zod';

/** A small file as a form brings it. */
const smallFile = z.custom<{ readonly name: string; readonly bytes: Uint8Array }>(
  (value) =>
    typeof value === 'object' && value !== null && 'bytes' in value && value.bytes instanceof Uint8Array,
  'Choose a captions file, .vtt or .srt.',
);

/** The language of captions, as BCP 47 tags it. */
const language = z
  .string('Say which language they are in.')
  .trim()
  .regex(/^[a-z]{2,3}(-[A-Za-z0-9]{2,8})*$/, 'Write the language as en, de or pt-BR.');

export const AddCaptionsInput = z.object({ file: smallFile, language });
export type AddCaptions = z.output<typeof AddCaptionsInput>;

export const AddedCaptions = z.object({ id: z.uuid(), cueCount: z.number(), warnings: z.array(z.string()) });
