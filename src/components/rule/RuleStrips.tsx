import { joinClasses } from '../join-classes.ts';
import { NOTE_KINDS } from '../note-kind.ts';
import { type RuleBalloon, type RulePop } from './rule-data.ts';
import { BalloonLeader, BalloonMark, PopLeader, PopMark, TONE_TEXT } from './RuleMarks.tsx';
import { placeForAllWidths } from './rule-widths.ts';

const BALLOON_GAP = 31;
const POP_GAP = 24;
const AT_PLACE = { shift: 0, row: 0 };

type StripProps<Mark> = {
  /** In the order of time. */
  readonly marks: readonly Mark[];
  readonly length: number;
  readonly percent: (at: number) => string;
  readonly className: string;
};

/** Parts above the rule, and the head of the pointer. */
export function BalloonStrips(props: StripProps<RuleBalloon> & { readonly now: number | undefined }) {
  const { marks, length, percent, className, now } = props;
  const shares = marks.map(({ at }) => at / length);
  return placeForAllWidths(shares, BALLOON_GAP).map((strip) => {
    const height = 14 + strip.rows * 30;
    const placed = marks.map((mark, index) => ({
      mark,
      place: strip.places[index] ?? AT_PLACE,
      x: percent(mark.at),
    }));
    return (
      <svg
        key={strip.className ?? 'all'}
        height={height}
        className={joinClasses(className, strip.className ?? 'block')}
        aria-hidden={marks.every(({ href }) => href === undefined)}
      >
        {placed.map(({ mark, place, x }) => (
          <BalloonLeader
            key={mark.id}
            x={x}
            place={place}
            edge={height}
            className={mark.filled === true ? 'text-brass-text' : 'text-dye'}
          />
        ))}
        {placed.map(({ mark, place, x }) => (
          <BalloonMark key={mark.id} mark={mark} place={place} x={x} edge={height} />
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
  });
}

/** Notes below the rule. */
export function PopStrips({ marks, length, percent, className }: StripProps<RulePop>) {
  const shares = marks.map(({ at }) => at / length);
  return placeForAllWidths(shares, POP_GAP).map((strip) => {
    const placed = marks.map((mark, index) => ({
      mark,
      place: strip.places[index] ?? AT_PLACE,
      x: percent(mark.at),
    }));
    return (
      <svg
        key={strip.className ?? 'all'}
        height={6 + strip.rows * 24}
        className={joinClasses(className, strip.className ?? 'block')}
      >
        {placed.map(({ mark, place, x }) => (
          <PopLeader key={mark.id} x={x} place={place} className={TONE_TEXT[NOTE_KINDS[mark.kind].tone]} />
        ))}
        {placed.map(({ mark, place, x }) => (
          <PopMark key={mark.id} mark={mark} place={place} x={x} />
        ))}
      </svg>
    );
  });
}
