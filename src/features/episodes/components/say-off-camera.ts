import { type RuleHatching } from '../../../components/rule/rule-data.ts';
import { type OffCameraCut } from '../companion.ts';

/** How wide the mark at a cut is, as a part of the rule. */
const MARK = 1 / 120;

/** Minutes of work as they are said. */
function sayMinutes(minutes: number): string {
  const [hours, rest] = [Math.floor(minutes / 60), minutes % 60];
  return [hours > 0 && `${String(hours)} h`, (rest > 0 || hours === 0) && `${String(rest)} min`]
    .filter((piece) => piece !== false)
    .join(' ');
}

/** Off-camera work as a rule shows it: a small hatched mark at the cut where the time is missing. */
export function hatchingsOf(cuts: readonly OffCameraCut[], length: number): RuleHatching[] {
  return cuts
    .filter(({ at }) => at < length)
    .map(({ at, minutes, texts }) => ({
      from: Math.max(0, at - (length * MARK) / 2),
      to: Math.min(length, at + (length * MARK) / 2),
      at,
      label: [`${sayMinutes(minutes)} of work`, ...texts].join(': '),
    }));
}
