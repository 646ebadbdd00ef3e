import { z } from 'zod';
import { NOTE_AUDIENCES, NOTE_KINDS, SIZE_STANDINGS } from '../../domain/note-kinds.ts';
import { runningText } from '../../domain/plain-text.ts';
import { PLACE_STATUSES } from '../../domain/place/place-statuses.ts';
import { PositionInput } from '../../domain/positions.ts';

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
/** Where a person says that a note was made: on an episode's time, on a clip, or in the shop. */
export const PlacedAnchor = z.discriminatedUnion('clock', [
  z.object({ clock: z.literal('episode'), episode: id, position: PositionInput }),
  z.object({ clock: z.literal('clip'), clip: id, position: PositionInput }),
  z.object({ clock: z.literal('shop'), shopAt: z.iso.datetime(), shopUntil: z.iso.datetime().nullable() }),
]);
export type PlacedAnchor = z.output<typeof PlacedAnchor>;
export const PlaceNoteInput = z.object({ version, anchor: PlacedAnchor });
export const AppearanceInput = z.object({ id, partId: id, position: PositionInput });

const position = z.object({
  frame: z.number(),
  endFrame: z.number().nullable(),
  rate: z.object({ num: z.number(), den: z.number() }),
});

/** What a desk says of where something comes in its edit. */
export const PlaceAnswer = z.object({
  status: z.enum(PLACE_STATUSES),
  /** The other places of a moment that is used more than once, in seconds of the episode. */
  also: z.array(z.number()),
  byPicture: z.boolean(),
  toEdge: z.boolean(),
  /** Of what is not in this edit: the segment that the edit before used it in. */
  dropped: z.string().nullable(),
  /** The clip it lies on, with seconds since that clip's first frame. */
  on: z.object({ id, clip: z.string(), at: z.number() }).nullable(),
});
export type Place = z.output<typeof PlaceAnswer>;

/** Whether something is shown by its episode's edit; everything is where there is none. */
export function isInEdit({ place }: { readonly place: Place | null }): boolean {
  return place === null || (place.status !== 'lost' && place.status !== 'no-footage');
}

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
  /** Null where the episode has no edit. */
  place: PlaceAnswer.nullable(),
  writtenBy: z.string().nullable(),
});
export type Note = z.output<typeof NoteAnswer>;

/** A note that was placed by hand, and what brings it back to where it was; null where nothing does. */
export const PlaceNoteAnswer = z.object({ note: NoteAnswer, before: PlacedAnchor.nullable() });

export const NotesAnswer = z.object({ items: z.array(NoteAnswer), nextCursor: z.null() });

export const AppearanceAnswer = z.object({
  id,
  version: z.number(),
  partId: id,
  position,
  place: PlaceAnswer.nullable(),
});
export type Appearance = z.output<typeof AppearanceAnswer>;
export const AppearancesAnswer = z.object({ items: z.array(AppearanceAnswer), nextCursor: z.null() });

export const RemovedAnswer = z.object({ id });
