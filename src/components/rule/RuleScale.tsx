import { graduate, numberRule, type Rank } from './graduations.ts';
import { showFrom } from './rule-widths.ts';

const LINE_LENGTHS: Record<Rank, number> = { 1: 7, 2: 12, 3: 19, 4: 23 };

type RuleScaleProps = { readonly length: number; readonly height: number };

/** The lines and numbers on the rule's face. One path a level, stretched to whatever width there is. */
export function RuleScale({ length, height }: RuleScaleProps) {
  return (
    <>
      {graduate(length).map((level) => {
        const shown = showFrom(level.minWidth);
        return shown === null ? null : (
          <svg
            key={level.every}
            width="100%"
            height={height}
            viewBox={`0 0 ${String(length)} ${String(height)}`}
            preserveAspectRatio="none"
            overflow="visible"
            className={shown.className}
          >
            <path
              d={level.at.map((at) => `M${String(at)} 0v${String(LINE_LENGTHS[level.rank])}`).join('')}
              className="stroke-steel-mark"
              vectorEffect="non-scaling-stroke"
              fill="none"
            />
          </svg>
        );
      })}
      {numberRule(length).map(({ at, text, minWidth }) => {
        const shown = showFrom(minWidth);
        return shown === null ? null : (
          <text
            key={at}
            x={`${String((at / length) * 100)}%`}
            dx={4}
            y={31}
            className={`fill-steel-mark font-mono text-[13px] font-semibold ${shown.className ?? ''}`}
          >
            {text}
          </text>
        );
      })}
    </>
  );
}
