import { z } from 'zod';
import { CREATION_MEANS, SLATE_READERS } from '../../domain/footage/clip-facts.ts';
import { CAMERA_NAME_LENGTH, CLIP_NAME_LENGTH } from '../../domain/footage/named-clip.ts';
import { parsePace } from '../../domain/footage/pace.ts';
import { lineOfText, runningText } from '../../domain/plain-text.ts';
import { buildParams, buildVersion } from '../builds/build.ts';

/** The most clips that are sent in one request; more go in several. */
export const CLIPS_AT_ONCE = 200;
/** The most parts that one clip may be said to show. */
export const MOST_CLIP_PARTS = 40;
/** A thumbnail made in the browser, in bytes. */
export const THUMBNAIL_BYTES = 20 * 1024;
/** A list of clips, in bytes. */
export const CLIP_LIST_BYTES = 6 * 1024 * 1024;
const STRETCH_TEXT_LENGTH = 300;
/** No clip is longer: ten days at 1000 frames a second. */
const MOST_FRAMES = 864_000_000;
/** Frames that come unevenly are kept one by one up to here: five hours at 60 a second. */
const MOST_FRAME_TIMES = 1_080_000;

const id = z.uuid('That is not an id of ours.');
const ofNone = z.literal('').transform(() => null);
const optionalId = z.union([ofNone, id], 'Choose one from the list.').nullable().default(null);
/** A box to tick: there when it is ticked. */
const ticked = z
  .union(
    [z.boolean(), z.literal('on').transform(() => true), z.literal('').transform(() => false)],
    'Tick it, or leave it.',
  )
  .default(false);

export const cameraParams = buildParams.extend({ camera: id });
export const clipParams = buildParams.extend({ clip: id });
export const slateParams = clipParams.extend({ slate: id });
export const stretchParams = buildParams.extend({ stretch: id });
export const VersionInput = z.object({ version: buildVersion });

const ZONE = 'Choose a time zone from the list.';
const camera = {
  name: lineOfText('Enter a name, such as “big camera”.', CAMERA_NAME_LENGTH),
  creationMeans: z.enum(CREATION_MEANS, 'Choose what its time means.').default('start'),
  localAsUtc: ticked,
  timeZone: z
    .union(
      [
        ofNone,
        z
          .string()
          .refine((zone) => zone === 'UTC' || Intl.supportedValuesOf('timeZone').includes(zone), ZONE),
      ],
      ZONE,
    )
    .nullable()
    .default(null),
};
export const AddCameraInput = z.object(camera);
export type CameraFields = z.output<typeof AddCameraInput>;
export const ChangeCameraInput = z.object({ ...camera, version: buildVersion });

const frame = z.int().min(0).max(MOST_FRAMES);
const namedClip = z.object({
  name: lineOfText('A clip has no name.', CLIP_NAME_LENGTH),
  camera: lineOfText('Name the camera.', CAMERA_NAME_LENGTH).nullable().default(null),
  frames: frame.min(1).nullable().default(null),
  rate: z.object({ num: z.int().min(1).max(1_000_000), den: z.int().min(1).max(10_000) }),
  startLabel: frame.nullable().default(null),
  drop: z.boolean().default(false),
  createdWall: z
    .string()
    .regex(/^\d{4}-\d{2}-\d{2}T\d{2}:\d{2}:\d{2}(\.\d{1,3})?$/)
    .refine((wall) => !Number.isNaN(Date.parse(`${wall}Z`)))
    .nullable()
    .default(null),
  createdOffset: z.int().min(-1440).max(1440).nullable().default(null),
  frameTimes: z.array(z.number().min(0).max(1e9)).max(MOST_FRAME_TIMES).nullable().default(null),
});
export const AddClipsInput = z.object({
  clips: z
    .array(namedClip, 'Send a list of clips.')
    .min(1, 'Send at least one clip.')
    .max(CLIPS_AT_ONCE, `Send at most ${String(CLIPS_AT_ONCE)} clips at once.`),
});
export type SentClip = z.output<typeof namedClip>;

export const ImportClipsInput = z.object({
  /** A file as it was uploaded. */
  file: z.unknown().optional(),
  text: z.string('Paste the list as text.').default(''),
  rate: z.string().trim().default('25'),
});

/** The same name given once or several times in a plain form. @param again what to say when it is something else */
function several(again: string, most: number) {
  return z
    .union([z.array(id), id.transform((one) => [one]), z.literal('').transform((): string[] => [])], {
      error: again,
    })
    .default([])
    .pipe(z.array(z.string()).max(most, `Choose at most ${String(most)}.`));
}
const parts = several('Choose the parts again.', MOST_CLIP_PARTS);

const pace = z
  .string()
  .default('')
  .transform((text, context) => {
    const read = parsePace(text);
    if (read.ok) return read.value;
    context.addIssue({ code: 'custom', message: read.error });
    return z.NEVER;
  });

export const ChangeClipInput = z.object({
  camera: optionalId,
  stage: optionalId,
  parts,
  pace,
  version: buildVersion,
});
export type ChangeClip = z.output<typeof ChangeClipInput>;

/** Tags put on several clips at once; what is left out stays as it is. */
export const TagClipsInput = z.object({
  clips: several('Choose the clips again.', CLIPS_AT_ONCE).pipe(
    z.array(z.string()).min(1, 'Choose at least one clip.'),
  ),
  stage: z.union([z.literal('keep'), z.literal('none'), id], 'Choose a stage.').default('keep'),
  parts,
  /** The page that a plain form goes back to. */
  back: z.string().max(400).default(''),
});

/** Sets when a clip began: at a wall time of the shop, or so many seconds later than now (earlier below zero). */
export const SetStartInput = z.object({
  at: z.string().trim().max(40).default(''),
  by: z.coerce.number('Enter seconds, such as -1.5.').min(-864_000).max(864_000).default(0),
  version: buildVersion,
});
export type SetStart = z.output<typeof SetStartInput>;

export const JoinClipInput = z.object({ before: id, version: buildVersion });

/** A slate as it was read: in which frame, or at which clip time; and the shop time it showed. */
export const AddSlateInput = z.object({
  frame: frame.optional(),
  moment: z.string().trim().max(40).default(''),
  shopMs: z.int().min(0).max(9_999_999_999_999).optional(),
  shows: z.string().trim().max(40).default(''),
  readBy: z.enum(SLATE_READERS).default('hand'),
});
export type AddSlate = z.output<typeof AddSlateInput>;

export const ThumbnailInput = z.object({
  jpeg: z.base64('Send the picture as base64.').max(Math.ceil((THUMBNAIL_BYTES * 4) / 3) + 4),
});

const stretchText = runningText(STRETCH_TEXT_LENGTH);
/** A timer is for work that is not filmed at all; a mark says that the camera was off from here. */
export const StartStretchInput = z.object({
  sign: z.enum(['timer', 'mark'], 'Choose what it is.').default('timer'),
  stage: optionalId,
  text: stretchText,
});
const DAY = 'Choose the day: year, month, day.';
const FROM = 'Write when it began, such as 14:20.';
const UNTIL = 'Write when it ended, such as 15:05.';
export const AddStretchInput = z.object({
  day: z.string(DAY).regex(/^\d{4}-\d{2}-\d{2}$/, DAY),
  from: z.string(FROM).regex(/^\d{1,2}:\d{2}$/, FROM),
  until: z.string(UNTIL).regex(/^\d{1,2}:\d{2}$/, UNTIL),
  stage: optionalId,
  text: stretchText,
});

export const CameraRow = z.object({ id, version: z.number() });
export const ClipRow = z.object({ id, version: z.number() });
export const IdRow = z.object({ id });
export const StretchRow = z.object({ id, version: z.number() });
const problems = z.array(z.object({ line: z.number(), text: z.string() })).readonly();
export const KeptClips = z.object({
  added: z.number(),
  updated: z.number(),
  /** In the order they were sent; null for one that was left out. */
  ids: z.array(id.nullable()).readonly(),
  problems,
});
export type KeptClips = z.output<typeof KeptClips>;
export const TaggedClips = z.object({ clips: z.number() });
