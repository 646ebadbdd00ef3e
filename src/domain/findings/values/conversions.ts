import Fraction from 'fraction.js';
import { phrase, type Speech } from '../speech/speech.ts';
import { type Claim } from './claim.ts';
import { inSi } from './si.ts';

/** Two values this close are one, told in two units: people round when they convert. Our own. */
const CLOSE = 0.05;
/** Words between a size and its conversion. */
const FAR = 14;
const CALLED =
  /\b(?:which is|that's|call it|that is|so|about|or|roughly|old money|metric|imperial|inches|freedom|for (?:my|the|you|anyone|anybody|those|our)|in english|american|basically|pretty much|near enough|give or take|equals|ish|works out|comes to|if you|otherwise known)\b/;

/** Leaves out a value that tells the one before again in other units: "450 mil, call it 18 inches". */
export function dropConversions(speech: Speech, claims: readonly Claim[]): Claim[] {
  return claims.filter((claim, index) => {
    const last = claims[index - 1];
    return last === undefined || !repeats(speech, last, claim);
  });
}

function repeats(speech: Speech, last: Claim, next: Claim): boolean {
  const gap = next.from - last.to;
  const [one] = last.values;
  const [other] = next.values;
  if (gap > FAR || one === undefined || other === undefined) return false;
  if (one.unit === other.unit || !(one.value instanceof Fraction) || !(other.value instanceof Fraction))
    return false;
  const [first, second] = [inSi(one.value, one.unit, {}), inSi(other.value, other.unit, {})];
  if (first === null || second === null || !alike(first.unit, second.unit)) return false;
  const [a, b] = [force(first), force(second)];
  if (Math.abs(a - b) > CLOSE * Math.max(Math.abs(a), Math.abs(b))) return false;
  return gap <= 3 || CALLED.test(phrase(speech, last.to, next.from));
}

/** What is lifted is told in tons of force and in kilograms alike. */
function alike(one: string, other: string): boolean {
  return one === other || (/^(?:N|kg)$/.test(one) && /^(?:N|kg)$/.test(other));
}

function force({ value, unit }: { value: Fraction; unit: string }): number {
  return value.valueOf() * (unit === 'kg' ? 9.80665 : 1);
}
