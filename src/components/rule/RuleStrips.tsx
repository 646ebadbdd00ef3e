import { joinClasses } from '../join-classes.ts';
import { NOTE_KINDS, type NoteTone } from '../note-kind.ts';
import { type RuleBalloon, type RulePop } from './rule-data.ts';
import { BalloonLeader, BalloonMark, PopLeader, PopMark, TONE_TEXT } from './RuleMarks.tsx';
import { placeForAllWidths } from './rule-widths.ts';

const BALLOON_GAP = 31;
const POP_GAP = 24;
const AT_PLACE = { shift: 0, row: 0 };

/** Past so many notes each would stand rows away from its place: they become a line of punched dots. */
const MOST_POPS = 60;

type StripProps<Mark> = {
  /** In the order of time. */
  readonly marks: readonly Mark[];
  readonly length: number;
  readonly percent: (at: number) => string;
  readonly className: string;
  readonly quiet: boolean;
};

/** Parts above the rule, and the head of the pointer. */
export function BalloonStrips(props: StripProps<RuleBalloon> & { readonly now: number | undefined }) {
  const { marks, length, percent, className, now, quiet } = props;
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
        aria-hidden={quiet || marks.every(({ href }) => href === undefined)}
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
          <BalloonMark key={mark.id} mark={mark} place={place} x={x} edge={height} quiet={quiet} />
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
export function PopStrips(props: StripProps<RulePop>) {
  const { marks, length, percent, className, quiet } = props;
  if (marks.length > MOST_POPS) return <PunchLine {...props} />;
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
        aria-hidden={quiet ? true : undefined}
      >
        {placed.map(({ mark, place, x }) => (
          <PopLeader key={mark.id} x={x} place={place} className={TONE_TEXT[NOTE_KINDS[mark.kind].tone]} />
        ))}
        {placed.map(({ mark, place, x }) => (
          <PopMark key={mark.id} mark={mark} place={place} x={x} quiet={quiet} />
        ))}
      </svg>
    );
  });
}

/** Many notes below the rule: a dot at each place, a row a tone. */
function PunchLine({ marks, length, className }: StripProps<RulePop>) {
  const tones = (Object.keys(TONE_TEXT) as NoteTone[]).filter((tone) =>
    marks.some(({ kind }) => NOTE_KINDS[kind].tone === tone),
  );
  const height = 6 + tones.length * 10;
  return (
    <svg
      height={height}
      viewBox={`0 0 ${String(length)} ${String(height)}`}
      preserveAspectRatio="none"
      className={joinClasses(className, 'block')}
      aria-hidden="true"
    >
      {tones.map((tone, row) => (
        <path
          key={tone}
          d={marks
            .filter(({ kind }) => NOTE_KINDS[kind].tone === tone)
            .map(({ at }) => `M${String(Math.round(at * 10) / 10)} ${String(8 + row * 10)}h0`)
            .join('')}
          className={TONE_TEXT[tone]}
          stroke="currentColor"
          strokeWidth="6"
          strokeLinecap="round"
          vectorEffect="non-scaling-stroke"
        />
      ))}
    </svg>
  );
}
