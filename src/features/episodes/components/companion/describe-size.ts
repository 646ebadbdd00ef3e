import { convertLimits } from '../../../../domain/lengths/convert-limits.ts';
import { type SizeFound } from '../../../../domain/lengths/find-sizes.ts';
import { formatBoth } from '../../../../domain/lengths/format-length.ts';
import { inInches, inMillimetres, type Length, systemOf } from '../../../../domain/lengths/length.ts';

/** A size in both systems, as a DimensionLine takes it. */
export interface SizeForms {
  readonly mm: string | undefined;
  readonly inch: string | undefined;
  readonly given: 'mm' | 'inch';
}

const WORDS = { by: ' × ', or: ' or ', to: ' to ', tolerance: ' ± ' } as const;

/**
 * A size that was found in a text: as it was typed, and in the other system. Limits, and a size with its tolerance,
 * are converted inwards; where nothing as fine lies within them, the other form is left out.
 */
export function describeSize({ typed, values, join }: SizeFound): SizeForms {
  const [first] = values;
  const given = first === undefined || systemOf(first.unit) === 'mm' ? 'mm' : 'inch';
  const other =
    join === 'to' || join === 'tolerance'
      ? limitsOf(values, join)
      : manyOf(values, join === null ? '' : WORDS[join]);
  return given === 'mm' ? { mm: typed, inch: other, given } : { mm: other, inch: typed, given };
}

/** Each value by itself; the unit once, at the end, as on a drawing. */
function manyOf(values: readonly Length[], word: string): string {
  const texts = values.map((value) => formatBoth(value).other.text);
  return texts.map((text, index) => (index < texts.length - 1 ? text.replace(/ \S+$/, '') : text)).join(word);
}

function limitsOf(values: readonly Length[], join: 'to' | 'tolerance'): string | undefined {
  const [a, b] = values;
  if (!a || !b) return undefined;
  const from = systemOf(a.unit);
  const [first, second] = [a, b].map(from === 'mm' ? inMillimetres : inInches);
  if (!first || !second) return undefined;
  const [least, most] =
    join === 'tolerance'
      ? [first.sub(second), first.add(second)]
      : first.lte(second)
        ? [first, second]
        : [second, first];
  const typed = Math.max(a.decimals ?? 2, b.decimals ?? 2);
  const decimals = from === 'mm' ? Math.min(5, Math.max(3, typed + 2)) : Math.min(4, Math.max(2, typed - 1));
  const limits = convertLimits({ least: least.toString(), most: most.toString() }, from, decimals);
  return limits === null ? undefined : `${limits.least} to ${limits.most} ${from === 'mm' ? 'in' : 'mm'}`;
}
