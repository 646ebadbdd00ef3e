import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { type CreationMeans } from './clip-facts.ts';

/** Before any camera that writes files of its own. Our own limit: a file that says 1904 or 1970 says nothing. */
const FIRST_YEAR = 1990;
const DAY_MS = 86_400_000;

/**
 * When a clip began by its camera's clock.
 * @param created what the file says, in milliseconds since 1970; null where it says nothing
 * @param means what this camera writes there
 * @param ran how long the clip ran, in seconds of the shop
 * @param now milliseconds since 1970
 * @returns milliseconds since 1970, exact; or why the time is no use. QuickTime counts from 1904, so that a camera
 *   whose clock was never set writes that year (QuickTime File Format, movie header)
 */
export function clipStart(
  created: number | null,
  means: CreationMeans,
  ran: Fraction,
  now: number,
): Answer<Fraction> {
  if (created === null || !Number.isFinite(created))
    return wrong('The file does not say when it was filmed.');
  const year = new Date(created).getUTCFullYear();
  if (Number.isNaN(year) || year < FIRST_YEAR || created > now + DAY_MS)
    return wrong(`The file says it was filmed in ${String(year)}: the camera’s clock was not set.`);
  const at = new Fraction(created);
  return right(means === 'start' ? at : at.sub(ran.mul(1000)));
}
