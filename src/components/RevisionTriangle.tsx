import { joinClasses } from './join-classes.ts';

type RevisionTriangleProps = {
  readonly letter: string;
  readonly state?: 'released' | 'draft' | 'superseded' | 'withdrawn' | undefined;
  /** Width in pixels. */
  readonly size?: number | undefined;
};

/** A plan revision: its letter in a triangle. A draft is dashed; what no longer holds is struck through. */
export function RevisionTriangle({ letter, state = 'released', size = 28 }: RevisionTriangleProps) {
  const past = state === 'superseded' || state === 'withdrawn';
  return (
    <svg
      role="img"
      aria-label={`Revision ${letter}, ${state}`}
      width={size}
      height={size}
      viewBox="0 0 28 28"
      className={joinClasses('inline-block shrink-0 align-middle', past ? 'text-ink-faint' : 'text-dye')}
    >
      <path
        d="M14 2.5L27 25.5H1Z"
        className="fill-sheet"
        stroke="currentColor"
        strokeDasharray={state === 'draft' ? '3 2.3' : undefined}
      />
      <text x="14" y="22" textAnchor="middle" className="fill-current font-mono text-[13px] font-semibold">
        {letter}
      </text>
      {past && <path d="M3 21L25 13" stroke="currentColor" />}
      {state === 'withdrawn' && <path d="M3 13L25 21" stroke="currentColor" />}
    </svg>
  );
}
