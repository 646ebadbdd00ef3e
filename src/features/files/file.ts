import { z } from 'zod';
import { FILE_KINDS, FILE_PURPOSES, FILE_STATES } from '../../domain/file-kinds.ts';
import { buildParams } from '../builds/build.ts';

const MiB = 1024 * 1024;

/** Uploads go in parts of this size, unless that makes too many. */
export const PART_BYTES = 16 * MiB;
/** The protocol of the storage takes no more parts of one object. */
const MOST_PARTS = 10_000;
/** Parts signed in one request. */
export const SIGNED_AT_ONCE = 20;
/** Unfinished uploads are given up after so many days. */
export const UNFINISHED_DAYS = 7;
/** What was deleted can be brought back for so many days. */
export const DELETED_DAYS = 30;
/** Of a file's beginning and end, for its fingerprint. */
export const FINGERPRINT_STRETCH = MiB;

export const FILE_NAME_LENGTH = 200;
/** Nobody shows more files on one page. */
export const FILES_AT_ONCE = 100;

/** The size of every part but the last, in bytes: the same for the browser and the server. */
export function partBytesFor(bytes: number): number {
  return Math.max(PART_BYTES, Math.ceil(Math.ceil(bytes / MOST_PARTS) / MiB) * MiB);
}

export function partCountFor(bytes: number): number {
  return Math.max(1, Math.ceil(bytes / partBytesFor(bytes)));
}

/** The exact size of one part. @param number from 1 */
export function partLength(bytes: number, number: number): number {
  const size = partBytesFor(bytes);
  return number === partCountFor(bytes) ? bytes - (number - 1) * size : size;
}

/** A name as the person's system has it: any characters but controls, and no path. */
const fileName = z
  .string('Choose a file.')
  .transform((name) =>
    name
      .normalize('NFC')
      .replace(/^.*[/\\]/, '')
      .replace(/[\p{Cc}\p{Cf}\u2028\u2029]/gu, '')
      .trim(),
  )
  .pipe(
    z
      .string()
      .min(1, 'The file has no name. Give it one and choose it again.')
      .max(FILE_NAME_LENGTH, 'The name of the file is too long. Shorten it and choose it again.'),
  );

export const StartUploadInput = z.object({
  name: fileName,
  bytes: z
    .int('Choose a file.')
    .min(1, 'The file is empty. Nothing was sent; look at it where it came from.'),
  purpose: z.enum(FILE_PURPOSES).default('footage'),
  fingerprint: z.string().regex(/^[0-9a-f]{64}$/, 'Choose the file again.'),
});
export type StartUpload = z.output<typeof StartUploadInput>;

export const fileParams = buildParams.extend({ file: z.uuid('That is not an id of ours.') });

const partNumber = z.int().min(1).max(MOST_PARTS);
export const SignPartsInput = z.object({
  numbers: z.array(partNumber).min(1).max(SIGNED_AT_ONCE, 'Ask for at most 20 parts at once.'),
});

export const ListFilesInput = z.object({
  purpose: z.enum(FILE_PURPOSES).optional(),
  before: z.uuid().optional(),
});
export type ListFiles = z.output<typeof ListFilesInput>;

export const StartedUpload = z.object({
  id: z.uuid(),
  bytes: z.int(),
  partBytes: z.int(),
  /** Whether parts of it may be there already. */
  resumed: z.boolean(),
});
export type StartedUpload = z.output<typeof StartedUpload>;

export const SignedParts = z.object({ parts: z.array(z.object({ number: z.int(), url: z.string() })) });
export const ListedParts = z.object({
  parts: z.array(z.object({ number: z.int(), bytes: z.int(), etag: z.string() })),
});
export const FileId = z.object({ id: z.uuid() });

const rate = z.object({ num: z.int(), den: z.int() });

/** A file as the bench shows it. */
export const FileItem = z.object({
  id: z.uuid(),
  name: z.string(),
  bytes: z.int(),
  purpose: z.enum(FILE_PURPOSES),
  state: z.enum(FILE_STATES),
  /** A sentence, when it failed. */
  failure: z.string().nullable(),
  /** Of the playable copy, in hundredths, while that is made. */
  progress: z.int().nullable(),
  kind: z.enum(FILE_KINDS).nullable(),
  width: z.int().nullable(),
  height: z.int().nullable(),
  duration: z.object({ frames: z.int(), rate }).nullable(),
  originalKept: z.boolean(),
  variants: z.array(
    z.object({
      variant: z.string(),
      bytes: z.int(),
      width: z.int().nullable(),
      height: z.int().nullable(),
      frames: z.int().nullable(),
    }),
  ),
  /** Where the camera says it was, in time: its own wall clock. */
  wallTime: z.string().nullable(),
  fingerprint: z.string().nullable(),
  addedAt: z.iso.datetime(),
});
export type FileItem = z.output<typeof FileItem>;

export const FilePage = z.object({ items: z.array(FileItem), nextCursor: z.uuid().nullable() });
export type FilePage = z.output<typeof FilePage>;

export const DroppedOriginals = z.object({ files: z.int(), bytes: z.int() });
/** Of one file, or of every file of the build that has a copy to stay. */
export const DropOriginalsInput = z.object({ file: z.uuid().optional() });

/** The kept forms of a file. */
export type Variant =
  | 'original'
  | 'video'
  | 'sound'
  | 'document'
  | 'poster'
  | 'thumb'
  | 'medium'
  | 'large'
  | 'filmstrip'
  | 'waveform'
  | 'frame-times';

/** What may stay when the original goes: that which viewers and editors look at. */
export const STAND_INS: readonly Variant[] = ['video', 'sound', 'document', 'large'];

/** Whether its original could go: something stands in for it. */
export function couldDropOriginal(file: {
  readonly state: string;
  readonly originalKept: boolean;
  readonly variants: readonly string[];
}): boolean {
  return (
    file.state === 'ready' &&
    file.originalKept &&
    file.variants.some((variant) => (STAND_INS as readonly string[]).includes(variant))
  );
}
