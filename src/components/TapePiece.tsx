import { PopDot } from './CentrePop.tsx';
import { joinClasses } from './join-classes.ts';
import { NOTE_KINDS, type NoteKind } from './note-kind.ts';
import { graduateStretch } from './rule/graduations.ts';
import { TONE_TEXT } from './rule/RuleMarks.tsx';
import { StretchLines } from './rule/StretchLines.tsx';

type TapePieceProps = {
  /** This note's second, and the next one's (or the episode's end). */
  readonly from: number;
  readonly to: number;
  readonly kind: NoteKind;
  readonly now?: number | undefined;
  readonly first?: boolean | undefined;
  readonly last?: boolean | undefined;
};

/** A row is at least this high, so lines thinned for it stay apart in every taller one. */
const LEAST_ROW = 96;

/**
 * The stretch of an upright tape beside one note, for a positioned row of any height: it runs from this note's
 * place, 24 px down its row, to the next note's. Decoration: the row itself says the time and the kind.
 */
export function TapePiece({ from, to, kind, now, first = false, last = false }: TapePieceProps) {
  const y = (at: number) => `${String(Math.round(((at - from) / (to - from)) * 10_000) / 100)}%`;
  const lines = graduateStretch(from, to, LEAST_ROW).filter(({ at }) => at > from);
  const face = 'steel-upright pointer-events-none absolute start-0 z-1 w-16 border-e border-steel-edge';
  return (
    <>
      {first && <span aria-hidden="true" className={`${face} top-0 h-6 border-t`} />}
      <svg
        aria-hidden="true"
        width="64"
        className={joinClasses(
          face,
          'top-6 overflow-visible',
          last ? 'h-[calc(100%-1.5rem)] border-b' : 'h-[calc(100%+1px)]',
        )}
      >
        <StretchLines lines={lines.map((line) => ({ ...line, y: y(line.at) }))} />
        {now !== undefined && now >= from && now < to && (
          <svg y={y(now)} overflow="visible" data-rule-now="">
            <path d="M0 0H54" className="stroke-brass-text" strokeWidth="2" />
            <path d="M54 -6V6L64 0Z" className="fill-brass stroke-brass-text" />
          </svg>
        )}
      </svg>
      <svg
        aria-hidden="true"
        width="24"
        height="24"
        viewBox="-12 -12 24 24"
        className={`pointer-events-none absolute start-[3.25rem] top-3 z-2 ${TONE_TEXT[NOTE_KINDS[kind].tone]}`}
      >
        <PopDot tone={NOTE_KINDS[kind].tone} />
      </svg>
    </>
  );
}
