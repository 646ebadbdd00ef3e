import { z } from 'zod';
import { EPISODE_STATES } from '../../domain/episode-states.ts';
import { lineOfText, runningText } from '../../domain/plain-text.ts';
import { PositionInput } from '../../domain/positions.ts';
import { buildParams } from '../builds/build.ts';
import { PlaceAnswer } from '../notes/note.ts';

export const EPISODE_TITLE_LENGTH = 120;
export const EPISODE_ABOUT_LENGTH = 5000;
export const CHAPTER_TITLE_LENGTH = 100;
/** How many episodes that are out already can be brought in at once. */
export const OUT_ALREADY_AT_ONCE = 50;

const id = z.uuid('That is not an id of ours.');
const version = z.coerce.number('Open the page again.').int().min(1);
const day = z.iso.date('Write the day as 2026-11-12.');
const number = z.coerce.number('Enter a number.').int('Enter a whole number.').min(1).max(9999);

export const episodeParams = buildParams.extend({ episode: id });
export const chapterParams = episodeParams.extend({ chapter: id });

const title = lineOfText('Enter a title.', EPISODE_TITLE_LENGTH);

export const MakeEpisodeInput = z.object({ title, number: number.optional() });
export const ChangeEpisodeInput = z.object({
  title,
  number,
  about: runningText(EPISODE_ABOUT_LENGTH),
  version,
});
export const VersionInput = z.object({ version });

/** Where the finished video is: a file kept here, or an address elsewhere. */
export const SetVideoInput = z.object({
  fileId: z
    .union([z.literal('').transform(() => null), id])
    .nullable()
    .default(null),
  address: z
    .union([z.literal('').transform(() => null), z.string().trim().max(2000)])
    .nullable()
    .default(null),
  /** Length of a video elsewhere, as typed: 14:08. */
  length: z.string().trim().max(20).optional(),
});
export type SetVideo = z.output<typeof SetVideoInput>;

const chapterTitle = lineOfText('Enter a title.', CHAPTER_TITLE_LENGTH);
export const AddChapterInput = z.object({ id, title: chapterTitle, position: PositionInput });
export const ChangeChapterInput = z.object({ title: chapterTitle, position: PositionInput, version });

export const PublishInput = z.object({
  version,
  /** The day it came out; today when left out. */
  publishedOn: z.union([z.literal('').transform(() => undefined), day]).optional(),
});

/** One episode that is out in the world already. */
const OutAlreadyRow = z.object({
  number,
  publishedOn: day,
  title,
  address: z
    .string('Give the address of the video.')
    .trim()
    .min(1, 'Give the address of the video.')
    .max(2000),
});

/** Episodes as they are typed, one a line: number; day; title; address. A title may hold semicolons. */
export const OutAlreadyInput = z
  .object({ lines: z.string('Enter at least one episode.').max(100_000) })
  .transform(({ lines }, context) => {
    const typed = lines.split(/\r?\n/).filter((line) => line.trim() !== '');
    const rows = typed.map((line, index) => {
      const [first, second, ...rest] = line.split(';').map((piece) => piece.trim());
      const read = OutAlreadyRow.safeParse({
        number: first,
        publishedOn: second,
        title: rest.slice(0, -1).join('; '),
        address: rest.at(-1),
      });
      if (read.success) return read.data;
      const said = read.error.issues[0]?.message ?? '';
      context.addIssue({ code: 'custom', path: ['lines'], message: `Line ${String(index + 1)}: ${said}` });
      return null;
    });
    if (typed.length === 0 || typed.length > OUT_ALREADY_AT_ONCE) {
      const message = `Enter 1 to ${String(OUT_ALREADY_AT_ONCE)} episodes, one a line.`;
      context.addIssue({ code: 'custom', path: ['lines'], message });
    }
    return { episodes: rows.filter((row) => row !== null) };
  });

export const MadeEpisode = z.object({ id });
export const EpisodeAnswer = z.object({
  id,
  version: z.number(),
  number: z.number(),
  title: z.string(),
  about: z.string(),
  state: z.enum(EPISODE_STATES),
});

export const ChapterAnswer = z.object({
  id,
  version: z.number(),
  title: z.string(),
  position: z.object({
    frame: z.number(),
    endFrame: z.number().nullable(),
    rate: z.object({ num: z.number(), den: z.number() }),
  }),
  /** Null where the episode has no edit. */
  place: PlaceAnswer.nullable(),
});
export type Chapter = z.output<typeof ChapterAnswer>;
export const ChaptersAnswer = z.object({ items: z.array(ChapterAnswer), nextCursor: z.null() });

/** The video of an episode, as its desk and its page know it. */
export interface Video {
  readonly id: string;
  readonly fileId: string | null;
  readonly address: string | null;
  /** Seconds; null while unknown. */
  readonly seconds: number | null;
  readonly rate: { readonly num: number; readonly den: number };
}
