import { formatNumber } from '../../../../domain/quantities/format-number.ts';
import { readInputs } from '../../../../domain/worksheets/worksheet.ts';
import { type RamResult, ramWorksheet } from '../../../../domain/ram/ram-worksheet.ts';
import { toGiven, type Typed } from '../../given.ts';

interface Run {
  readonly label: string;
  readonly seconds: number;
  readonly speed: number;
}

const [WIDTH, HEIGHT, LEFT, BOTTOM] = [460, 200, 56, 168] as const;

/** The stroke as runs of one speed each: out fast, out under load, back. Empty where it is not known when the load comes on. */
function runsOf({ stages, extendS, retractS }: RamResult, typed: Typed): readonly Run[] {
  const [first, last] = [stages[0], stages.at(-1)];
  const read = readInputs(ramWorksheet.inputs, toGiven(typed, ramWorksheet.inputs));
  if (first === undefined || last === undefined || extendS === null || retractS === null || !read.ok)
    return [];
  const stroke = read.value.stroke.valueOf();
  const loaded = read.value.pressing?.valueOf() ?? 0;
  return [
    { label: 'out', seconds: (stroke - loaded) / first.extendMmPerS, speed: first.extendMmPerS },
    { label: 'under load', seconds: loaded / last.extendMmPerS, speed: last.extendMmPerS },
    { label: 'back', seconds: retractS, speed: -first.retractMmPerS },
  ].filter(({ seconds }) => seconds > 0);
}

/** A cycle of the ram as its speed over time. */
export function StrokePicture({ result, typed }: { readonly result: RamResult; readonly typed: Typed }) {
  const runs = runsOf(result, typed);
  const total = runs.reduce((sum, { seconds }) => sum + seconds, 0);
  if (total === 0) return null;
  const speeds = [0, ...runs.map(({ speed }) => speed)];
  const [most, least] = [Math.max(...speeds), Math.min(...speeds)];
  const xOf = (seconds: number) => LEFT + (seconds / total) * (WIDTH - LEFT - 8);
  const yOf = (speed: number) => 20 + ((most - speed) / (most - least)) * (BOTTOM - 36);
  const begins = runs.map((_, index) => runs.slice(0, index).reduce((sum, { seconds }) => sum + seconds, 0));
  const drawn = runs.map((run, index) => {
    const from = begins[index] ?? 0;
    const x = xOf(from);
    return { ...run, x, width: xOf(from + run.seconds) - x, y: yOf(Math.max(run.speed, 0)) };
  });
  const say = ({ label, seconds, speed }: Run) =>
    `${label} ${formatNumber(Math.abs(speed), 3)} mm/s for ${formatNumber(seconds, 3)} s`;
  return (
    <figure className="max-w-xl border border-line bg-sheet p-3">
      <svg
        viewBox={`0 0 ${String(WIDTH)} ${String(HEIGHT)}`}
        role="img"
        aria-label={runs.map(say).join('; ')}
        className="w-full"
      >
        {drawn.map(({ label, x, width, y, speed }) => (
          <g key={label}>
            <rect
              x={x}
              y={y}
              width={width}
              height={Math.abs(yOf(speed) - yOf(0))}
              className={`stroke-ink ${label === 'under load' ? 'fill-brass-wash' : 'fill-dye-wash'}`}
            />
            <text x={LEFT - 6} y={yOf(speed) + 4} textAnchor="end" className="fill-ink font-mono text-[11px]">
              {formatNumber(speed, 3)}
            </text>
          </g>
        ))}
        <path d={`M${String(LEFT)} ${String(yOf(0))}H${String(WIDTH - 8)}`} className="stroke-ink" />
        <text x={LEFT} y={HEIGHT - 6} className="fill-ink font-mono text-[11px]">
          0 s
        </text>
        <text x={WIDTH - 8} y={HEIGHT - 6} textAnchor="end" className="fill-ink font-mono text-[11px]">
          {formatNumber(total, 3)} s
        </text>
      </svg>
      <figcaption className="text-sm text-ink-soft">
        Speed in mm/s over a cycle: {runs.map(say).join('; ')}.
      </figcaption>
    </figure>
  );
}
