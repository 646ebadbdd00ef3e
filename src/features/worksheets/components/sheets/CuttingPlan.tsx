import { type StockResult } from '../../../../domain/stock/stock-worksheet.ts';
import { formatNumber } from '../../../../domain/quantities/format-number.ts';

type Bar = StockResult['bars'][number];

const [WIDTH, HEIGHT] = [900, 54] as const;
/** A label needs so many units of the picture. */
const LABEL_WIDTH = 34;

const show = (mm: number) => formatNumber(mm, 7);

function sayBar({ pieces, left, stock }: Bar): string {
  const cut = pieces.map(({ length, name }) => (name === null ? show(length) : `${show(length)} ${name}`));
  return `A bar of ${show(stock)} mm: ${cut.join(', ')}; ${show(left)} mm left`;
}

function BarPicture({ bar, longest }: { readonly bar: Bar; readonly longest: number }) {
  const scale = WIDTH / longest;
  const width = bar.stock * scale;
  return (
    <svg
      viewBox={`0 0 ${String(WIDTH)} ${String(HEIGHT)}`}
      role="img"
      aria-label={sayBar(bar)}
      className="w-full"
    >
      <rect x="0.5" y="0.5" width={width - 1} height="29" className="fill-ground stroke-ink" />
      {bar.pieces.map(({ length, mark }) => {
        const x = (mark - length) * scale;
        return (
          <g key={mark}>
            <rect x={x} y="0.5" width={length * scale} height="29" className="fill-dye-wash stroke-ink" />
            {length * scale > LABEL_WIDTH && (
              <text
                x={x + (length * scale) / 2}
                y="20"
                textAnchor="middle"
                className="fill-ink font-mono text-[13px] font-semibold"
              >
                {show(length)}
              </text>
            )}
            <path d={`M${String(mark * scale)} 30v7`} className="stroke-ink" />
          </g>
        );
      })}
    </svg>
  );
}

/** Bars to scale, in cutting order, with running marks from the end that the tape hooks on. */
export function CuttingPlan({ bars, bought, lowerBound }: StockResult) {
  const longest = Math.max(...bars.map(({ stock }) => stock));
  return (
    <div className="grid gap-4">
      <p className="font-bold">
        {bought === 1 ? '1 bar to buy' : `${String(bought)} bars to buy`}
        {bought === lowerBound
          ? ': proven, no plan buys fewer.'
          : `: not proven; fewer than ${String(lowerBound)} is ruled out.`}
      </p>
      <ol className="grid gap-4">
        {bars.map((bar, at) => (
          <li key={at} className="grid break-inside-avoid gap-1">
            <h2 className="text-base">
              {bar.offcut ? 'Offcut' : 'Bar'} {at + 1},{' '}
              <span className="font-mono">{show(bar.stock)} mm</span>
            </h2>
            <BarPicture bar={bar} longest={longest} />
            <p className="font-mono text-sm">
              Marks:{' '}
              {bar.pieces
                .map(({ mark, name }) => (name === null ? show(mark) : `${show(mark)} (${name})`))
                .join(' · ')}
            </p>
            <p className="text-sm text-ink-soft">
              {bar.left === 0 ? 'Nothing is left.' : `${show(bar.left)} mm left in one length.`}
            </p>
          </li>
        ))}
      </ol>
      <p className="text-sm text-ink-soft">
        Marks run from the end that the tape hooks on, in mm; cut on the far side of each.
      </p>
    </div>
  );
}
