import { joinClasses } from '../join-classes.ts';
import { NOTE_KINDS, type NoteTone } from '../note-kind.ts';
import { PopDot } from '../CentrePop.tsx';
import { formatClock } from './clock.ts';
import { type PlacedMark } from './place-marks.ts';
import { type RuleBalloon, type RulePop } from './rule-data.ts';

const RADIUS = 13.5;

export const TONE_TEXT: Record<NoteTone, string> = {
  dye: 'text-dye',
  brass: 'text-brass-text',
  primer: 'text-primer',
};

/** Three figures fill a balloon; longer numbers are written smaller rather than cut. */
export function numberSize(label: string): string {
  return label.length <= 3 ? 'text-[12px]' : label.length === 4 ? 'text-[10px]' : 'text-[8px]';
}

/** From a balloon's centre down to the rule's upper edge, and from its lower edge down to a pop's centre. */
const balloonY = (place: PlacedMark, edge: number) => edge - 28 - place.row * 30;
const popY = (place: PlacedMark) => 14 + place.row * 24;

type LeaderProps = { readonly x: string; readonly place: PlacedMark; readonly className: string };

/** Leaders are drawn before all balloons, so that none crosses a number. */
export function BalloonLeader({ x, place, edge, className }: LeaderProps & { readonly edge: number }) {
  const y = balloonY(place, edge) + RADIUS;
  return (
    <svg x={x} overflow="visible" className={className}>
      <path d={`M${String(place.shift)} ${String(y)}L0 ${String(edge - 1)}`} stroke="currentColor" />
    </svg>
  );
}

export function PopLeader({ x, place, className }: LeaderProps) {
  return (
    <svg x={x} overflow="visible" className={className}>
      <path d={`M0 -5V0L${String(place.shift)} ${String(popY(place))}`} stroke="currentColor" fill="none" />
    </svg>
  );
}

type MarkProps<Mark> = {
  readonly mark: Mark;
  readonly place: PlacedMark;
  readonly x: string;
  /** The page lists the same beside the rule: its links are for pointers only. */
  readonly quiet: boolean;
};

/** A part above the rule. `edge` is the rule's upper edge. */
export function BalloonMark({
  mark,
  place,
  x,
  edge,
  quiet,
}: MarkProps<RuleBalloon> & { readonly edge: number }) {
  const name = mark.name === undefined ? '' : `, ${mark.name}`;
  const drawing = (
    <g transform={`translate(${String(place.shift)} ${String(balloonY(place, edge))})`}>
      <title>{`${mark.label}${name}, from ${formatClock(mark.at)}`}</title>
      <circle
        r={RADIUS}
        strokeDasharray={mark.dashed === true ? '3 2.5' : undefined}
        className="fill-sheet stroke-dye in-data-filled:fill-brass in-data-filled:stroke-ink"
      />
      <text
        dy="0.35em"
        textAnchor="middle"
        className={joinClasses(
          'fill-dye font-mono font-semibold in-data-filled:fill-on-brass',
          numberSize(mark.label),
        )}
      >
        {mark.label}
      </text>
    </g>
  );
  return (
    <svg
      x={x}
      overflow="visible"
      data-balloon={mark.id}
      data-at={mark.at}
      data-filled={mark.filled === true ? '' : undefined}
    >
      {mark.href === undefined ? (
        drawing
      ) : (
        <a href={mark.href} tabIndex={quiet ? -1 : undefined}>
          {drawing}
        </a>
      )}
    </svg>
  );
}

/** A note below the rule: a link to its moment. Drawn from the rule's lower edge down. */
export function PopMark({ mark, place, x, quiet }: MarkProps<RulePop>) {
  const { label, tone } = NOTE_KINDS[mark.kind];
  return (
    <svg x={x} overflow="visible" className={TONE_TEXT[tone]} data-pop={mark.id} data-at={mark.at}>
      <a
        href={mark.href}
        tabIndex={quiet ? -1 : undefined}
        aria-label={`${formatClock(mark.at)}, ${label}: ${mark.label}`}
      >
        <g transform={`translate(${String(place.shift)} ${String(popY(place))})`}>
          <title>{`${formatClock(mark.at)} ${label}: ${mark.label}`}</title>
          <rect x="-12" y="-12" width="24" height="24" fill="transparent" />
          <PopDot tone={tone} />
        </g>
      </a>
    </svg>
  );
}
