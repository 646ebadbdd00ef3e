/** As much of a clip as is looked at. Times in milliseconds since 1970; null when unknown. */
interface Run {
  readonly id: string;
  readonly name: string;
  readonly camera: { readonly id: string } | null;
  readonly from: number | null;
  readonly until: number | null;
  readonly rate: { readonly num: number; readonly den: number };
}

/** Whole seconds in files, and a frame lost between two. Our own choice, in milliseconds. */
const SEAM_MS = 1500;

/** The last number in a file's name: cameras count their files up (DCF, JEITA CP-3461, section 3.2: four digits). */
function numberIn(name: string): number | null {
  const digits = /(\d+)\D*$/.exec(name.replace(/\.[^.]*$/, ''))?.[1];
  return digits === undefined ? null : Number(digits);
}

/**
 * The clip that a camera probably split this one from: its own, the number before, at the same rate, and no gap
 * between them.
 */
export function proposeJoin<Clip extends Run>(clip: Clip, all: readonly Clip[]): Clip | null {
  const { from, camera, rate } = clip;
  const number = numberIn(clip.name);
  if (from === null || camera === null || number === null) return null;
  return (
    all.find(
      (other) =>
        other.id !== clip.id &&
        other.camera?.id === camera.id &&
        other.until !== null &&
        Math.abs(from - other.until) <= SEAM_MS &&
        other.rate.num * rate.den === rate.num * other.rate.den &&
        numberIn(other.name) === number - 1,
    ) ?? null
  );
}
