import { after, before, type Speech } from '../speech/speech.ts';
import { firstWords, lastWords } from './classify.ts';
import { FREE_BEHIND, GRITS, HEATED, PAPER_BEHIND, SANDED } from './contexts.ts';
import { type Measure } from './measures.ts';

/**
 * Whether a number is a grit, where sanding is spoken of: eighty, then one twenty.
 * @param chained whether a grit stands close before
 */
export function isGrit(speech: Speech, measure: Measure, chained: boolean): boolean {
  const [first] = measure.terms;
  if (
    first === undefined ||
    !measure.terms.every(
      ({ value, unit }) => GRITS.has(value.valueOf()) && (unit === null || unit === 'grit'),
    )
  )
    return false;
  const b = `${before(speech, measure.from, 18)} `;
  const a = after(speech, measure.to, 8);
  if (measure.dimension === 'grit' || PAPER_BEHIND.test(a))
    return measure.dimension === 'grit' || SANDED.test(`${b}${firstWords(a, 3)}`);
  if (!FREE_BEHIND.test(a) && !/^(?:then|up|all|being)\b/.test(a)) return false;
  if (chained)
    return (
      /\b(?:then|to|and|and then|at|with|by|than|finish|after|before|through|or|up|next|from) (?:a |the |with |at |up to |then )*$/.test(
        b,
      ) ||
      /\b\d+ $/.test(b) ||
      GRITS.has(Number(lastWords(b, 1)))
    );
  return (
    SANDED.test(b) &&
    (/\b(?:so|at|to|with|then|from|with a|of|start|just|about|in|it|by|up|through|sanding|grit|on) $/.test(
      b,
    ) ||
      /^(?:to start|first|then|and then|to begin|up to)\b/.test(a)) &&
    !HEATED.test(lastWords(b, 2))
  );
}
