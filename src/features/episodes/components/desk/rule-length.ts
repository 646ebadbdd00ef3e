import { type Rate } from '../../../../domain/time/rate.ts';

/** How long a rule is drawn, in frames: the video's length, or room for what is marked where that is unknown. */
export function ruleLength(
  known: number | null,
  marks: readonly { readonly frame: number }[],
  { num, den }: Rate,
): number {
  if (known !== null && known > 0) return known;
  const minutes = (count: number) => Math.round((count * 60 * num) / den);
  return Math.max(minutes(10), ...marks.map(({ frame }) => frame + minutes(1)));
}
