import { joinClasses } from './join-classes.ts';
import { numberSize } from './rule/RuleMarks.tsx';

type BalloonProps = {
  /** The part's number; null for a part that has none. */
  readonly number: string | null;
  /** The part's name, for whoever cannot see what stands beside the balloon. */
  readonly name?: string | undefined;
  /** On the bench now. */
  readonly filled?: boolean | undefined;
  /** Not in the plans. */
  readonly dashed?: boolean | undefined;
  readonly href?: string | undefined;
  readonly size?: 'small' | 'medium' | 'large' | undefined;
};

const SIZES = { small: 28, medium: 36, large: 60 };

/**
 * A part, as on an assembly drawing: its number in a circle. `data-filled` on anything around it fills it too, so
 * that a small script can follow the video.
 */
export function Balloon({
  number,
  name,
  filled = false,
  dashed = false,
  href,
  size = 'small',
}: BalloonProps) {
  const pixels = SIZES[size];
  const said = [
    number === null ? 'Part without a number' : `Part ${number}`,
    name,
    filled ? 'on the bench now' : undefined,
    dashed ? 'not in the plans' : undefined,
  ];
  const drawing = (
    <svg width={pixels} height={pixels} viewBox="-14 -14 28 28" aria-hidden="true" className="block">
      <circle
        r="13.5"
        strokeDasharray={dashed ? '3 2.3' : undefined}
        vectorEffect="non-scaling-stroke"
        className={joinClasses(
          'fill-sheet stroke-dye in-data-filled:fill-brass in-data-filled:stroke-ink',
          href !== undefined && 'group-hover:fill-dye-wash',
        )}
      />
      <circle r="11.5" className="hidden fill-none stroke-on-brass in-data-filled:inline" strokeWidth="0.5" />
      <text
        dy="0.35em"
        textAnchor="middle"
        className={joinClasses(
          'fill-dye font-mono font-semibold in-data-filled:fill-on-brass',
          numberSize(number ?? ''),
        )}
      >
        {number ?? '–'}
      </text>
    </svg>
  );
  const text = <span className="sr-only">{said.filter((part) => part !== undefined).join(', ')}</span>;
  const mark = filled ? '' : undefined;
  return href === undefined ? (
    <span data-filled={mark} className="inline-block shrink-0 align-middle">
      {drawing}
      {text}
    </span>
  ) : (
    <a href={href} data-filled={mark} className="group inline-block shrink-0 rounded-full align-middle">
      {drawing}
      {text}
    </a>
  );
}
