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

type MarkProps<Mark> = { readonly mark: Mark; readonly place: PlacedMark; readonly length: number };

/** A part above the rule, on its leader. `edge` is the rule's upper edge. */
export function BalloonMark({
  mark,
  place,
  length,
  edge,
}: MarkProps<RuleBalloon> & { readonly edge: number }) {
  const y = edge - 28 - place.row * 30;
  const drawing = (
    <>
      <title>{`${mark.label}${mark.name === undefined ? '' : `, ${mark.name}`}, from ${formatClock(mark.at)}`}</title>
      <circle
        cx={place.shift}
        cy={y}
        r={RADIUS}
        strokeDasharray={mark.dashed === true ? '3 2.5' : undefined}
        className={mark.filled === true ? 'fill-brass stroke-ink' : 'fill-sheet stroke-dye'}
      />
      <text
        x={place.shift}
        y={y}
        dy="0.35em"
        textAnchor="middle"
        className={joinClasses(
          'font-mono font-semibold',
          numberSize(mark.label),
          mark.filled === true ? 'fill-on-brass' : 'fill-dye',
        )}
      >
        {mark.label}
      </text>
    </>
  );
  return (
    <svg
      x={`${String((mark.at / length) * 100)}%`}
      overflow="visible"
      data-balloon={mark.id}
      data-at={mark.at}
    >
      <path
        d={`M${String(place.shift)} ${String(y + RADIUS)}L0 ${String(edge - 1)}`}
        className={mark.filled === true ? 'stroke-brass-text' : 'stroke-dye'}
      />
      {mark.href === undefined ? <g>{drawing}</g> : <a href={mark.href}>{drawing}</a>}
    </svg>
  );
}

/** A note below the rule: a link to its moment. Drawn from the rule's lower edge down. */
export function PopMark({ mark, place, length }: MarkProps<RulePop>) {
  const { label, tone } = NOTE_KINDS[mark.kind];
  const y = 14 + place.row * 24;
  return (
    <svg
      x={`${String((mark.at / length) * 100)}%`}
      overflow="visible"
      className={TONE_TEXT[tone]}
      data-pop={mark.id}
      data-at={mark.at}
    >
      <path d={`M0 -5V0L${String(place.shift)} ${String(y)}`} stroke="currentColor" fill="none" />
      <a href={mark.href} aria-label={`${formatClock(mark.at)}, ${label}: ${mark.label}`}>
        <title>{`${formatClock(mark.at)} ${label}: ${mark.label}`}</title>
        <g transform={`translate(${String(place.shift)} ${String(y)})`}>
          <rect x="-12" y="-12" width="24" height="24" fill="transparent" />
          <PopDot tone={tone} />
        </g>
      </a>
    </svg>
  );
}
