import { type StretchLine } from './graduations.ts';

const STARTS = { 1: 55, 2: 48, 3: 40, 4: 36 } as const;

type StretchLinesProps = {
  /** `y` in pixels, or a share of the height such as "40%". */
  readonly lines: readonly (StretchLine & { readonly y: number | string })[];
};

/** Lines and numbers across an upright tape 64 px wide, from its working edge inwards. */
export function StretchLines({ lines }: StretchLinesProps) {
  return (
    <g aria-hidden="true">
      {lines.map(({ at, rank, text, y }) => (
        <svg key={at} y={y} overflow="visible">
          <path d={`M${String(STARTS[rank])} 0H64`} className="stroke-steel-mark" />
          {text !== undefined && (
            <text
              x="34"
              dy="0.35em"
              textAnchor="end"
              className="fill-steel-mark font-mono text-[13px] font-semibold"
            >
              {text}
            </text>
          )}
        </svg>
      ))}
    </g>
  );
}
