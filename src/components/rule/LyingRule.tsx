import { useId } from 'react';
import { RuleChapters } from './RuleChapters.tsx';
import { type RuleData } from './rule-data.ts';
import { RuleScale } from './RuleScale.tsx';
import { BalloonStrips, PopStrips } from './RuleStrips.tsx';

const FACE = 46;

/** All strips start at the rule's zero; the face goes on past both ends, with the hole to hang it by. */
const STRIP = 'ms-4 w-[calc(100%-3.75rem)] overflow-visible';

const byTime = (a: { readonly at: number }, b: { readonly at: number }) => a.at - b.at;

/** The rule lying down: parts above it, its face, notes and chapters below it. */
export function LyingRule({
  length,
  balloons = [],
  pops = [],
  chapters = [],
  hatchings = [],
  now,
  quiet = false,
}: RuleData) {
  const hatch = useId();
  const percent = (at: number) => `${String(Math.round((at / length) * 100_000) / 1000)}%`;
  const strip = { length, percent, className: STRIP, quiet };
  return (
    <div className="@container">
      <BalloonStrips {...strip} marks={balloons.toSorted(byTime)} now={now} />
      <div className="steel border border-steel-edge" data-rule-face="">
        <svg height={FACE} className={`${STRIP} block`} aria-hidden="true">
          <pattern
            id={hatch}
            width="5"
            height="5"
            patternUnits="userSpaceOnUse"
            patternTransform="rotate(-45)"
          >
            <path d="M0 2.5H5" className="stroke-steel-mark" strokeWidth="0.75" />
          </pattern>
          {hatchings.map(({ from, to, label }) => (
            <rect
              key={from}
              x={percent(from)}
              y="34"
              width={percent(to - from)}
              height="12"
              fill={`url(#${hatch})`}
              className="stroke-steel-hatch"
            >
              {label !== undefined && <title>{`Camera off: ${label}`}</title>}
            </rect>
          ))}
          <RuleScale length={length} height={FACE} />
          <svg x="100%" overflow="visible">
            <circle cx="30" cy={FACE / 2} r="5" className="fill-ground stroke-steel-edge" />
          </svg>
          {now !== undefined && (
            <svg x={percent(now)} overflow="visible" data-rule-now="">
              <path d={`M0 0V${String(FACE)}`} className="stroke-brass-text" strokeWidth="3" />
              <path d={`M0 0V${String(FACE)}`} className="stroke-brass" strokeWidth="1.5" />
            </svg>
          )}
        </svg>
      </div>
      <PopStrips {...strip} marks={pops.toSorted(byTime)} />
      <RuleChapters
        chapters={chapters.toSorted(byTime)}
        length={length}
        className={`${STRIP} block`}
        quiet={quiet}
      />
    </div>
  );
}
