import { useId } from 'react';
import { joinClasses } from '../join-classes.ts';
import { BalloonMark, PopMark } from './RuleMarks.tsx';
import { RuleChapters } from './RuleChapters.tsx';
import { type RuleData } from './rule-data.ts';
import { RuleScale } from './RuleScale.tsx';
import { placeForAllWidths } from './rule-widths.ts';

const FACE = 46;
const BALLOON_GAP = 31;
const POP_GAP = 24;

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
}: RuleData) {
  const hatch = useId();
  const percent = (at: number) => `${String(Math.round((at / length) * 100_000) / 1000)}%`;
  const shares = (marks: readonly { readonly at: number }[]) => marks.map(({ at }) => at / length);
  const above = balloons.toSorted(byTime);
  const below = pops.toSorted(byTime);

  return (
    <div className="@container">
      {placeForAllWidths(shares(above), BALLOON_GAP).map(({ className, places, rows }) => {
        const height = 14 + rows * 30;
        return (
          <svg
            key={className ?? 'all'}
            height={height}
            className={joinClasses(STRIP, className ?? 'block')}
            aria-hidden={above.every(({ href }) => href === undefined)}
          >
            {above.map((mark, index) => (
              <BalloonMark
                key={mark.id}
                mark={mark}
                place={places[index] ?? { shift: 0, row: 0 }}
                length={length}
                edge={height}
              />
            ))}
            {now !== undefined && (
              <svg x={percent(now)} overflow="visible" data-rule-now="">
                <path
                  d={`M-6 ${String(height - 9)}H6L0 ${String(height)}Z`}
                  className="fill-brass stroke-brass-text"
                />
              </svg>
            )}
          </svg>
        );
      })}
      <div className="steel border border-steel-edge">
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
          {hatchings.map(({ from, to }) => (
            <rect
              key={from}
              x={percent(from)}
              y="34"
              width={percent(to - from)}
              height="12"
              fill={`url(#${hatch})`}
              className="stroke-steel-hatch"
            />
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
      {placeForAllWidths(shares(below), POP_GAP).map(({ className, places, rows }) => (
        <svg
          key={className ?? 'all'}
          height={6 + rows * 24}
          className={joinClasses(STRIP, className ?? 'block')}
        >
          {below.map((mark, index) => (
            <PopMark
              key={mark.id}
              mark={mark}
              place={places[index] ?? { shift: 0, row: 0 }}
              length={length}
            />
          ))}
        </svg>
      ))}
      <RuleChapters chapters={chapters.toSorted(byTime)} length={length} className={`${STRIP} block`} />
    </div>
  );
}
