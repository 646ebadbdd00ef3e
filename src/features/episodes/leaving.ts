import { z } from 'zod';
import { type Chapter } from '../../domain/chapters/chapter.ts';
import { USUAL_DESCRIPTION_LENGTH } from '../../domain/description/write-description.ts';

/** The longest text that anyone asks for. Our own limit. */
const MOST_LENGTH = 100_000;

const NO_LENGTH = `Give the length in characters, up to ${MOST_LENGTH.toLocaleString('en-GB')}.`;
const length = z.coerce
  .number(NO_LENGTH)
  .int(NO_LENGTH)
  .min(0, NO_LENGTH)
  .max(MOST_LENGTH, NO_LENGTH)
  .default(USUAL_DESCRIPTION_LENGTH);

/** The forms in which an episode's words leave: its text, and its chapters for players. */
export const LEAVING_FORMS = ['text', 'vtt', 'json'] as const;
export type LeavingForm = (typeof LEAVING_FORMS)[number];

export const LeavingFileInput = z.object({ as: z.enum(LEAVING_FORMS, 'Choose text, vtt or json.'), length });

/** What goes with an episode when it leaves. */
export interface Leaving {
  readonly text: string;
  readonly leftOut: readonly string[];
  readonly length: number;
  readonly chapters: readonly Chapter[];
  /** What is wrong with the chapters, or keeps hosts from showing them. */
  readonly faults: readonly string[];
  /** A WebVTT track of the chapters; null while the video's length is not known, or there are none. */
  readonly vtt: string | null;
  /** The same for podcast players. */
  readonly json: string | null;
}

const start = z.coerce.number('Choose a chapter.').int('Choose a chapter.').min(0).max(864_000_000);
/** Which of the proposed chapters are taken: by their starts in milliseconds. */
export const AcceptChaptersInput = z.object({
  start: z.union([start.transform((one) => [one]), z.array(start).max(1000)], 'Choose at least one chapter.'),
});
export const AcceptedChapters = z.object({ added: z.number() });
