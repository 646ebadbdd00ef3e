import { type files, type fileVariants } from '../../../db/schema/files.ts';
import { type FileItem } from '../file.ts';
import { type Probe } from '../probe.ts';

type FileRow = typeof files.$inferSelect;
type VariantRow = Pick<typeof fileVariants.$inferSelect, 'variant' | 'bytes' | 'width' | 'height' | 'frames'>;

/** A file as the bench shows it. */
export function presentFile(row: FileRow, variants: readonly VariantRow[]): FileItem {
  const { durationFrames, rateNum, rateDen } = row;
  return {
    id: row.id,
    name: row.name,
    bytes: row.bytes,
    purpose: row.purpose,
    state: row.state,
    failure: row.failure,
    progress: row.progress,
    kind: row.kind,
    width: row.width,
    height: row.height,
    duration:
      durationFrames !== null && rateNum !== null && rateDen !== null
        ? { frames: durationFrames, rate: { num: rateNum, den: rateDen } }
        : null,
    originalKept: row.originalKept,
    variants: variants.map(({ variant, bytes, width, height, frames }) => ({
      variant,
      bytes,
      width,
      height,
      frames,
    })),
    wallTime: (row.probe as Probe | null)?.camera?.wallTime ?? null,
    fingerprint: row.state === 'uploading' ? row.fingerprint : null,
    addedAt: row.createdAt.toISOString(),
  };
}
