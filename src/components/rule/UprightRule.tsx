import { NOTE_KINDS } from '../note-kind.ts';
import { PopDot } from '../CentrePop.tsx';
import { formatClock } from './clock.ts';
import { graduateStretch } from './graduations.ts';
import { TONE_TEXT } from './RuleMarks.tsx';
import { type RuleData } from './rule-data.ts';
import { StretchLines } from './StretchLines.tsx';

export type RulePosition = { readonly at: number; readonly y: number };

type UprightRuleProps = RuleData & {
  /** Where each note stands beside the tape, in pixels, rising; time runs evenly between two of them. */
  readonly positions: readonly RulePosition[];
  readonly height: number;
};

/** The tape: the rule upright, stretched so that each note's place is beside its words. */
export function UprightRule({ length, positions, height, pops = [], now }: UprightRuleProps) {
  const ends = [
    { at: 0, y: 0 },
    ...positions.filter(({ at }) => at > 0 && at < length),
    { at: length, y: height },
  ];
  const stretches = ends.slice(1).map((end, index) => ({ start: ends[index] ?? end, end }));
  const yAt = (at: number) => {
    const stretch = stretches.find(({ end }) => at <= end.at) ?? stretches.at(-1);
    if (stretch === undefined || stretch.end.at === stretch.start.at) return 0;
    const { start, end } = stretch;
    return start.y + ((at - start.at) / (end.at - start.at)) * (end.y - start.y);
  };
  return (
    <div className="steel-upright w-16 border-e border-steel-edge">
      <svg width="64" height={height} overflow="visible" className="block">
        {stretches.map(({ start, end }) => (
          <StretchLines
            key={start.at}
            lines={graduateStretch(start.at, end.at, end.y - start.y).map((line) => ({
              ...line,
              y: yAt(line.at),
            }))}
          />
        ))}
        {now !== undefined && (
          <svg y={yAt(now)} overflow="visible" data-rule-now="">
            <path d="M0 0H54" className="stroke-brass-text" strokeWidth="2" />
            <path d="M54 -6V6L64 0Z" className="fill-brass stroke-brass-text" />
          </svg>
        )}
        {pops.map((pop) => {
          const { label, tone } = NOTE_KINDS[pop.kind];
          return (
            <a
              key={pop.id}
              href={pop.href}
              aria-label={`${formatClock(pop.at)}, ${label}: ${pop.label}`}
              className={TONE_TEXT[tone]}
            >
              <g transform={`translate(64 ${String(yAt(pop.at))})`}>
                <rect x="-12" y="-12" width="24" height="24" fill="transparent" />
                <PopDot tone={tone} />
              </g>
            </a>
          );
        })}
      </svg>
    </div>
  );
}
