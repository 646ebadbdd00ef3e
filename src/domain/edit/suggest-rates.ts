import { LISTED_RATES, type Rate } from '../time/rate.ts';
import { hasDropFrame } from '../time/timecode.ts';

const LABEL = /(?<![\d:;])\d{1,2}[:;.]\d{2}[:;.]\d{2}([:;.])(\d{2})(?!\d)/g;

/**
 * The rates at which all labels of an edit list exist, since the list does not say its own. Clips at another rate may
 * narrow them too far: the list is what is asked, not the answer.
 * @returns the listed rates that fit, in rising order; none for a list that mixes rates
 */
export function suggestRates(list: string): Rate[] {
  let highest = 0;
  let drops = /^\s*FCM\s*:\s*DROP/im.test(list);
  for (const [, separator, frames] of list.matchAll(LABEL)) {
    highest = Math.max(highest, Number(frames));
    if (separator === ';') drops = true;
  }
  return LISTED_RATES.filter((rate) => {
    const nominal = Math.round(rate.num / rate.den);
    return highest < nominal && (!drops || hasDropFrame(rate));
  });
}
