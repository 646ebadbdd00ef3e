import { z } from 'zod';
import { AppearanceAnswer, NoteAnswer } from '../notes/note.ts';
import { ChapterAnswer } from './episode.ts';

const CheckAnswer = z.object({
  id: z.string(),
  level: z.enum(['must', 'should']),
  holds: z.boolean(),
  sentence: z.string(),
  place: z.object({
    section: z.enum(['details', 'video', 'edit', 'chapters', 'captions', 'notes', 'parts']),
    ids: z.array(z.string()),
  }),
});

/** What the server holds of an episode's desk, asked for again and again while the desk is open. */
export const DeskAnswer = z.object({
  notes: z.array(NoteAnswer),
  chapters: z.array(ChapterAnswer),
  appearances: z.array(AppearanceAnswer),
  checks: z.array(CheckAnswer),
  offCamera: z.array(z.object({ at: z.number(), minutes: z.number(), texts: z.array(z.string()) })),
});
export type DeskLists = z.output<typeof DeskAnswer>;
