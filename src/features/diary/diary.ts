import { z } from 'zod';
import { lineOfText, runningText } from '../../domain/plain-text.ts';
import { buildParams, buildVersion } from '../builds/build.ts';

export const ENTRY_LENGTH = 20_000;
export const DESCRIPTION_LENGTH = 300;
/** Photos that one entry shows. */
export const MOST_PHOTOS = 40;

const id = z.uuid('That is not an id of ours.');
export const entryParams = buildParams.extend({ entry: id });

const day = z
  .string('Choose the day.')
  .regex(/^\d{4}-\d{2}-\d{2}$/, 'Choose the day: year, month, day.')
  .refine((text) => isDay(text), 'There is no such day. Choose another.');

function isDay(text: string): boolean {
  const date = new Date(`${text}T00:00:00Z`);
  return (
    !Number.isNaN(date.getTime()) && date.toISOString().startsWith(text) && text >= '1900' && text < '2200'
  );
}

const DESCRIBED = `Keep the description to ${String(DESCRIPTION_LENGTH)} characters.`;
const description = z
  .string(DESCRIBED)
  .default('')
  .transform((text) => text.replace(/\s+/g, ' ').trim())
  .pipe(z.union([z.literal(''), lineOfText('', DESCRIPTION_LENGTH)], DESCRIBED));

const photos = z
  .array(z.object({ file: id, description }), 'Choose the photos again.')
  .max(MOST_PHOTOS, `Choose at most ${String(MOST_PHOTOS)} photos for one entry.`)
  .default([]);

const entry = z.object({
  day,
  stage: z
    .union([z.literal('').transform(() => null), id], 'Choose a stage.')
    .nullable()
    .default(null),
  text: runningText(ENTRY_LENGTH),
  visibility: z.enum(['private', 'public'], 'Choose who may see it.').default('private'),
  photos,
});

/** In a plain form each photo is a box to tick, `photo-ID`, with a description beside it, `photo-ID-says`. */
function gatherPhotos(values: unknown): unknown {
  if (typeof values !== 'object' || values === null || 'photos' in values) return values;
  const sent = values as Record<string, unknown>;
  const chosen = Object.keys(sent).flatMap((key) => /^photo-([\da-f-]{36})$/.exec(key)?.[1] ?? []);
  return {
    ...sent,
    photos: chosen.map((file) => ({ file, description: sent[`photo-${file}-says`] ?? '' })),
  };
}

function saysSomething(input: { text: string; photos: readonly unknown[] }): boolean {
  return input.text !== '' || input.photos.length > 0;
}
const EMPTY = { path: ['text'], message: 'Write something, or choose a photo.' };

export const AddEntryInput = z.preprocess(gatherPhotos, entry.refine(saysSomething, EMPTY));
export type AddEntry = z.output<typeof AddEntryInput>;

export const ChangeEntryInput = z.preprocess(
  gatherPhotos,
  entry.extend({ version: buildVersion }).refine(saysSomething, EMPTY),
);
export type ChangeEntry = z.output<typeof ChangeEntryInput>;

export const EntryVersionInput = z.object({ version: buildVersion });

export interface DiaryPhoto {
  readonly file: string;
  readonly description: string;
  readonly width: number | null;
  readonly height: number | null;
}

/** A diary entry as pages show it. */
export interface DiaryEntry {
  readonly id: string;
  /** A date, year first. */
  readonly day: string;
  readonly stage: { readonly id: string; readonly name: string } | null;
  readonly text: string;
  /** The text as HTML that is safe to show. */
  readonly html: string;
  readonly visibility: 'private' | 'public';
  readonly writtenBy: string | null;
  readonly photos: readonly DiaryPhoto[];
  readonly version: number;
}

/** A day as it is read: "Tue 3 November 2026". */
export function sayDay(date: string): string {
  return new Date(`${date}T12:00:00Z`).toLocaleDateString('en-GB', {
    weekday: 'short',
    day: 'numeric',
    month: 'long',
    year: 'numeric',
    timeZone: 'UTC',
  });
}
