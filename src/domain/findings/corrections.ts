import Fraction from 'fraction.js';
import { formatNumber } from '../quantities/format-number.ts';
import { type ListedPart } from './finding.ts';
import { type Claim } from './values/claim.ts';
import { inSi } from './values/si.ts';

/** A spoken size that is probably a slip for the one that the parts list gives. */
export interface Correction {
  readonly claim: Claim;
  readonly part: string;
  readonly sentence: string;
}

/** Sizes closer than this are one: a spoken fraction of an inch is rounded more coarsely. Our own. */
const SAME = 0.01;

/**
 * Sizes that disagree with the part they belong to in a way that tongues and ears slip: a digit lost, teen for ty, a
 * decimal place. Any other size may be another one of the part, and is left alone.
 * @param about the part that a word is about
 */
export function findCorrections(
  claims: readonly Claim[],
  parts: readonly ListedPart[],
  about: (word: number) => string | null,
): Correction[] {
  const sizes = new Map(parts.map(({ number, sizesMm = [] }) => [number, sizesMm]));
  return claims.flatMap((claim) => {
    const part = claim.kind === 'size' && claim.dimension === 'length' ? about(claim.from) : null;
    const nominal = part === null ? [] : (sizes.get(part) ?? []);
    if (part === null || nominal.length === 0) return [];
    return claim.values.flatMap(({ value, unit }) => {
      const mm = value instanceof Fraction ? inSi(value, unit, {})?.value.mul(1000).valueOf() : undefined;
      if (mm === undefined || nominal.some((size) => isSame(size, mm))) return [];
      const meant = nominal.find((size) => isSlip(mm, size));
      if (meant === undefined) return [];
      const said = `${formatNumber(mm)} mm`;
      return [{ claim, part, sentence: `Says ${said}; part ${part} is ${formatNumber(meant)} mm.` }];
    });
  });
}

function isSame(one: number, other: number): boolean {
  return Math.abs(one - other) <= SAME * Math.max(one, other);
}

function isSlip(said: number, meant: number): boolean {
  return (
    isSame(said * 10, meant) ||
    isSame(said, meant * 10) ||
    isTeen(said, meant) ||
    isShort(said, meant) ||
    isShort(meant, said)
  );
}

/** Fourteen and forty. */
function isTeen(said: number, meant: number): boolean {
  const [teen, ty] = said < meant ? [said, meant] : [meant, said];
  return teen >= 13 && teen <= 19 && ty === (teen - 10) * 10;
}

/** 60 for 160, 420 for 1420: the front of the number was lost. */
function isShort(short: number, long: number): boolean {
  const [ending, whole] = [formatNumber(short), formatNumber(long)];
  return ending.length >= 2 && whole.length === ending.length + 1 && whole.endsWith(ending);
}
