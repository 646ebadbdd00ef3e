import { NOTE_KINDS } from '../note-kind.ts';
import { formatClock } from './clock.ts';
import { type RuleData } from './rule-data.ts';

/** What the rule shows, in words and in the order of time, for whoever cannot see it. */
export function RuleList({ balloons = [], pops = [], chapters = [], hatchings = [] }: RuleData) {
  const lines = [
    ...chapters.map(({ at, label }) => ({ at, text: `chapter: ${label}` })),
    ...hatchings.map(({ from, to, at, label }) => ({
      at: at ?? from,
      text: `camera off${at === undefined ? ` until ${formatClock(to)}` : ' here'}${label === undefined ? '' : `: ${label}`}`,
    })),
    ...balloons.map(({ at, label, name }) => ({
      at,
      text: `on the bench: ${label}${name === undefined ? '' : `, ${name}`}`,
    })),
    ...pops.map(({ at, kind, label }) => ({ at, text: `${NOTE_KINDS[kind].label}: ${label}` })),
  ].sort((a, b) => a.at - b.at);
  return (
    <ol className="sr-only">
      {lines.map(({ at, text }) => (
        <li key={`${String(at)}-${text}`}>
          {formatClock(at)}, {text}
        </li>
      ))}
    </ol>
  );
}
