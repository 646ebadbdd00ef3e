import { z } from 'zod';
import { type ComparedSegment } from '../../domain/edit/compare-edits.ts';
import { type Edit, type EditWarning } from '../../domain/edit/edit.ts';
import { EDIT_SOURCES, type EditSource, type WrittenSource } from '../../domain/edit/edit-sources.ts';
import { type UnalignedStretch } from '../../domain/place/align-captions.ts';
import { type Rate } from '../../domain/time/rate.ts';
import { type EditReport } from './edit-report.ts';
import { episodeParams } from './episode.ts';

/** What the text of an edit may have. */
export const EDIT_TEXT_BYTES = 6 * 1024 * 1024;

/** Said where a rate is asked and something else comes. */
export const NO_RATE = 'Choose a rate, such as 25 or 30000/1001.';

export const editParams = episodeParams.extend({ edit: z.uuid('That is not an id of ours.') });

/** What a name of an edit may stand for besides a clip of the footage. */
export const MATCHES = {
  /** Footage that stays at home: a clip of that name is added. */
  named: 'named',
  /** A graphic, a title, music: nothing that was filmed. */
  none: 'none',
} as const;

const numbered = (prefix: string, values: Readonly<Record<string, unknown>>): Record<string, string> =>
  Object.fromEntries(
    Object.entries(values).flatMap(([key, value]) =>
      key.startsWith(prefix) && /^\d{1,6}$/.test(key.slice(prefix.length)) && typeof value === 'string'
        ? [[key.slice(prefix.length), value]]
        : [],
    ),
  );

/**
 * An edit on its way in: as a file, as text, or packed as the look at it gave it back. `match-3` says what the edit's
 * fourth name stands for, `clip-rate-3` what its source is counted in.
 */
export const ReadEditInput = z
  .looseObject({
    /** A file as it was uploaded. */
    file: z.unknown().optional(),
    text: z.string('Paste the edit as text.').default(''),
    packed: z.string('Choose the file again.').default(''),
    name: z.string('Name the edit.').trim().max(200, 'Keep the name to 200 characters.').default(''),
    /** Frames a second; empty for what the timeline or the video says. */
    rate: z.string(NO_RATE).trim().max(20, NO_RATE).default(''),
    /** The number of the newest edit when this one was looked at; 0 before the first. */
    seen: z.coerce.number().int().min(0).optional(),
  })
  .transform(({ file, text, packed, name, rate, seen, ...rest }) => ({
    file,
    text,
    packed,
    name,
    rate,
    seen,
    matches: numbered('match-', rest),
    clipRates: numbered('clip-rate-', rest),
  }));
export type ReadEdit = z.output<typeof ReadEditInput>;

/** A clip of the footage as it is chosen from. */
export interface ClipChoice {
  readonly id: string;
  readonly label: string;
}

/** A name of an edit, with what it may stand for. */
export interface EditName {
  readonly name: string;
  readonly alsoCalled: readonly string[];
  readonly uses: number;
  /** Ids of clips that fit, or a word of `MATCHES`; empty while one must be chosen. */
  readonly match: string;
  /** Clips that its name and labels fit. */
  readonly proposed: readonly string[];
  /** It was said in an earlier edit of the build. */
  readonly earlier: boolean;
  /** What its source is counted in, when that was said; empty for the rate of the edit. */
  readonly clipRate: string;
  /** What the matched footage runs at, where that is another rate than its source is counted in. */
  readonly footageRate: Rate | null;
}

/** An edit that has been looked at, nothing kept. */
export interface EditView {
  readonly name: string;
  readonly packed: string;
  readonly source: WrittenSource;
  /** As it was chosen or suggested: `25`, `30000/1001`; empty while nobody has said. */
  readonly rate: string;
  /** Why that rate is suggested, or that it must be chosen. */
  readonly rateReason: string;
  /** Null where it cannot be read at that rate; then `error` says why. */
  readonly edit: Edit | null;
  readonly error: string | null;
  readonly warnings: readonly EditWarning[];
  readonly names: readonly EditName[];
  readonly clips: readonly ClipChoice[];
  readonly lengthsApart: string | null;
  /** The number of the newest edit; 0 before the first. */
  readonly seen: number;
  /** What it does to the newest edit; null before the first. */
  readonly compared: readonly ComparedSegment[] | null;
  /** What it does to everything that is anchored; null while it cannot be read. */
  readonly report: EditReport | null;
}

/** A version of an episode's edit, as listed. */
export interface EditVersion {
  readonly id: string;
  readonly number: number;
  readonly source: EditSource;
  readonly sourceName: string;
  readonly takenBy: string | null;
  readonly takenAt: Date;
  readonly frames: number;
  readonly rate: Rate;
  /** Numbers of the editions that were published with it. */
  readonly editions: readonly number[];
}

const segments = z.object({ picture: z.number(), sound: z.number() });
export const EditViewAnswer = z.object({
  name: z.string(),
  source: z.enum(EDIT_SOURCES),
  rate: z.string(),
  rateReason: z.string(),
  error: z.string().nullable(),
  warnings: z.array(z.object({ line: z.number().nullable(), sentence: z.string() })).readonly(),
  names: z
    .array(z.object({ name: z.string(), match: z.string(), proposed: z.array(z.string()).readonly() }))
    .readonly(),
  lengthsApart: z.string().nullable(),
  seen: z.number(),
});

export const TakenEdit = z.object({ id: z.uuid(), number: z.number(), segments });

/** The forms that an edit and its marks leave in. */
const EDIT_FILE_FORMS = ['edl', 'otio', 'csv'] as const;
export type EditFileForm = (typeof EDIT_FILE_FORMS)[number];

const as = z.enum(EDIT_FILE_FORMS, 'Choose edl, otio or csv.');
export const ExportEditInput = z.object({
  as,
  /** The marks that it came with, or the notes and chapters. */
  marks: z.enum(['own', 'notes'], 'Choose own or notes.').default('own'),
});
export const ExportClipMarksInput = z.object({
  as,
  /** Of the timeline; of the first clip when left out. */
  rate: z.string(NO_RATE).trim().max(20, NO_RATE).default(''),
});

/** An edit built by hand: rows of clip, in, out. */
export const BuildEditInput = z.object({
  segments: z
    .string('Add at least one clip, with its in and out.')
    .max(200_000, 'That is too much for one edit built by hand.'),
  rate: z.string(NO_RATE).trim().max(20, NO_RATE).default(''),
});
export type BuildEdit = z.output<typeof BuildEditInput>;

/** A move by the captions, as it was looked at: the number of the newest captions, so that no others are taken. */
export const MoveByCaptionsInput = z.object({
  captions: z.coerce.number('Look at what moves first.').int('Look at what moves first.').min(1),
});
export type MoveByCaptions = z.output<typeof MoveByCaptionsInput>;

/** Notes can move by the captions of two versions. */
export interface CaptionMove {
  /** The number of the newest captions. */
  readonly captions: number;
  /** What the captions of the version before and of the new one were called. */
  readonly from: string;
  readonly to: string;
  /** Null until it is asked for: two hours take a second or two. */
  readonly look: CaptionMoveLook | null;
}

/** What moving by the captions would do, nothing kept. */
export interface CaptionMoveLook {
  /** Milliseconds of the version before that were found in the new one. */
  readonly found: number;
  readonly length: number;
  readonly unaligned: readonly UnalignedStretch[];
  readonly report: EditReport;
}
