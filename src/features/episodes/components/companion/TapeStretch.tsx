import { PopDot } from '../../../../components/CentrePop.tsx';
import { joinClasses } from '../../../../components/join-classes.ts';
import { type NoteTone } from '../../../../components/note-kind.ts';
import { graduateStretch } from '../../../../components/rule/graduations.ts';
import { TONE_TEXT } from '../../../../components/rule/RuleMarks.tsx';

type TapeStretchProps = {
  /** Seconds of this row, and of the next one or the end. */
  readonly from: number;
  readonly to: number;
  /** Of the note's mark; null for a row that has none, such as a chapter's. */
  readonly tone: NoteTone | null;
  readonly first: boolean;
  readonly last: boolean;
};

/** A row is at least this high, so lines thinned for it stay apart in every taller one. */
const LEAST_ROW = 72;
const STARTS = { 1: 55, 2: 48, 3: 40, 4: 36 } as const;

/**
 * The stretch of an upright tape beside one row of any height: from this row's place, 24 px down, to the next
 * row's. Decoration: the rows themselves say their times.
 */
export function TapeStretch({ from, to, tone, first, last }: TapeStretchProps) {
  const share = (at: number) => Math.round(((at - from) / (to - from)) * 1000) / 10;
  const lines = graduateStretch(from, to, LEAST_ROW).filter(({ at }) => at > from);
  const face = 'steel-upright absolute start-0 z-1 w-16 border-e border-steel-edge';
  return (
    <>
      {first && <span className={`${face} top-0 h-6 border-t`} />}
      <svg
        aria-hidden="true"
        width="64"
        className={joinClasses(
          face,
          'top-6 overflow-visible',
          last ? 'h-[calc(100%-1.5rem)] border-b' : 'h-[calc(100%+1px)]',
        )}
      >
        <svg viewBox="0 0 64 100" preserveAspectRatio="none" width="64" height="100%" overflow="visible">
          <path
            d={lines.map(({ at, rank }) => `M${String(STARTS[rank])} ${String(share(at))}H64`).join('')}
            className="stroke-steel-mark"
            vectorEffect="non-scaling-stroke"
          />
        </svg>
        {lines.map(({ at, text }) =>
          text === undefined ? null : (
            <text
              key={at}
              x="34"
              y={`${String(share(at))}%`}
              dy="0.35em"
              textAnchor="end"
              className="fill-steel-mark font-mono text-[13px] font-semibold"
            >
              {text}
            </text>
          ),
        )}
      </svg>
      {tone !== null && (
        <svg
          aria-hidden="true"
          width="24"
          height="24"
          viewBox="-12 -12 24 24"
          className={`absolute start-[3.25rem] top-3 z-2 ${TONE_TEXT[tone]}`}
        >
          <PopDot tone={tone} />
        </svg>
      )}
    </>
  );
}
