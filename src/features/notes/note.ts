import { z } from 'zod';
import { NOTE_AUDIENCES, NOTE_KINDS, SIZE_STANDINGS } from '../../domain/note-kinds.ts';
import { runningText } from '../../domain/plain-text.ts';
import { type Position, PositionInput } from '../../domain/positions.ts';

export const NOTE_TEXT_LENGTH = 2000;
export const NOTE_PARTS_LENGTH = 20;

const id = z.uuid('That is not an id of ours.');
export const version = z.int('Open the page again.').min(1);

/** What names an episode in an address. */
export const episodeParams = z.object({ workshop: z.string().min(1), build: z.string().min(1), episode: id });
export const noteParams = episodeParams.extend({ note: id });
export const appearanceParams = episodeParams.extend({ appearance: id });

const fields = {
  kind: z.enum(NOTE_KINDS, 'Choose what kind of note it is.'),
  text: runningText(NOTE_TEXT_LENGTH),
  audience: z.enum(NOTE_AUDIENCES, 'Choose who sees it.').default('team'),
  askedId: id.nullable().default(null),
  standing: z.enum(SIZE_STANDINGS).nullable().default(null),
  topic: z.string().max(40).nullable().default(null),
  partIds: z
    .array(id)
    .max(NOTE_PARTS_LENGTH, `Name at most ${String(NOTE_PARTS_LENGTH)} parts.`)
    .default([]),
  position: PositionInput,
};

function requireAsked(input: { audience: string; askedId: string | null }): boolean {
  return input.audience !== 'person' || input.askedId !== null;
}
const ASKED = { path: ['askedId'], error: 'Choose who is asked.' };

/** A usual caution has words of its own; any other note needs some. */
function requireWords({ text, topic }: { text: string; topic: string | null }): boolean {
  return text !== '' || topic !== null;
}
const WORDS = { path: ['text'], error: 'Write what the note says.' };

/** The id is made by whoever adds the note, so that one sent twice is kept once. */
export const AddNoteInput = z
  .object({ ...fields, id })
  .refine(requireAsked, ASKED)
  .refine(requireWords, WORDS);
export const ChangeNoteInput = z
  .object({ ...fields, version })
  .refine(requireAsked, ASKED)
  .refine(requireWords, WORDS);
export type NoteFields = Omit<z.output<typeof ChangeNoteInput>, 'version'>;

export const VersionInput = z.object({ version });
export const AnswerNoteInput = z.object({ version, answer: runningText(NOTE_TEXT_LENGTH) });
export const AppearanceInput = z.object({ id, partId: id, position: PositionInput });

const position = z.object({
  frame: z.number(),
  endFrame: z.number().nullable(),
  rate: z.object({ num: z.number(), den: z.number() }),
});

/** A note as its team sees it. */
export const NoteAnswer = z.object({
  id,
  version: z.number(),
  kind: z.enum(NOTE_KINDS),
  text: z.string(),
  audience: z.enum(NOTE_AUDIENCES),
  asked: z.object({ id, name: z.string() }).nullable(),
  answer: z.string().nullable(),
  standing: z.enum(SIZE_STANDINGS).nullable(),
  topic: z.string().nullable(),
  proposed: z.boolean(),
  partIds: z.array(id),
  position,
  writtenBy: z.string().nullable(),
});
export type Note = z.output<typeof NoteAnswer>;

export const NotesAnswer = z.object({ items: z.array(NoteAnswer), nextCursor: z.null() });

export const AppearanceAnswer = z.object({ id, version: z.number(), partId: id, position });
export type Appearance = z.output<typeof AppearanceAnswer>;
export const AppearancesAnswer = z.object({ items: z.array(AppearanceAnswer), nextCursor: z.null() });

/** Where a stored anchor stands. */
export function positionOf(anchor: {
  readonly frame: number | null;
  readonly endFrame: number | null;
  readonly rateNum: number | null;
  readonly rateDen: number | null;
}): Position {
  const { frame, endFrame, rateNum, rateDen } = anchor;
  if (frame === null || rateNum === null || rateDen === null) throw new Error('The anchor has no frames.');
  return { frame, endFrame, rate: { num: rateNum, den: rateDen } };
}

export const RemovedAnswer = z.object({ id });
