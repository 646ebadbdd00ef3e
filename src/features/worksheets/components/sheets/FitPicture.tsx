import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { type Deviations } from '../../../../domain/fits/iso-286.ts';

type Band = { readonly label: string; readonly deviations: Deviations; readonly fill: string };

type FitPictureProps = {
  readonly title: string;
  readonly bands: readonly Band[];
};

const [WIDTH, HEIGHT, MARGIN] = [420, 220, 28] as const;
const [FIRST, WIDE, APART] = [150, 90, 120] as const;

function sign(um: number): string {
  return um > 0 ? `+${formatNumber(um)}` : formatNumber(um);
}

/** Tolerances as bands about the zero line, to scale in micrometres. */
export function FitPicture({ title, bands }: FitPictureProps) {
  const limits = [0, ...bands.flatMap(({ deviations: { upper, lower } }) => [upper, lower])];
  const [top, bottom] = [Math.max(...limits), Math.min(...limits)];
  const scale = (HEIGHT - 2 * MARGIN) / Math.max(top - bottom, 1);
  const yOf = (um: number) => MARGIN + (top - um) * scale;
  return (
    <figure className="max-w-lg border border-line bg-sheet p-3">
      <svg
        viewBox={`0 0 ${String(WIDTH)} ${String(HEIGHT)}`}
        role="img"
        aria-label={bands
          .map(
            ({ label, deviations: { upper, lower } }) =>
              `${label} from ${sign(lower)} to ${sign(upper)} micrometres`,
          )
          .join('; ')}
        className="w-full"
      >
        <path
          d={`M8 ${String(yOf(0))}H${String(WIDTH - 8)}`}
          className="stroke-ink"
          strokeDasharray="14 4 3 4"
        />
        <text x="8" y={yOf(0) - 5} className="fill-ink font-mono text-[12px]">
          nominal, 0
        </text>
        {bands.map(({ label, deviations: { upper, lower }, fill }, at) => {
          const x = FIRST + at * APART;
          const height = Math.max((upper - lower) * scale, 1);
          return (
            <g key={label}>
              <rect x={x} y={yOf(upper)} width={WIDE} height={height} className={`${fill} stroke-ink`} />
              <text
                x={x + WIDE / 2}
                y={yOf(upper) + height / 2 + 5}
                textAnchor="middle"
                className="fill-ink font-mono text-[14px] font-semibold"
              >
                {label}
              </text>
              <text
                x={x + WIDE / 2}
                y={yOf(upper) - 5}
                textAnchor="middle"
                className="fill-ink font-mono text-[12px]"
              >
                {sign(upper)}
              </text>
              <text
                x={x + WIDE / 2}
                y={yOf(upper) + height + 14}
                textAnchor="middle"
                className="fill-ink font-mono text-[12px]"
              >
                {sign(lower)}
              </text>
            </g>
          );
        })}
      </svg>
      <figcaption className="text-sm text-ink-soft">{title}. Micrometres, to scale.</figcaption>
    </figure>
  );
}
