import { joinClasses } from './join-classes.ts';
import { type NoteTone } from './note-kind.ts';

type PopTone = NoteTone | 'mark' | 'faint';

type CentrePopProps = {
  /** Width and height in pixels. */
  readonly size?: number | undefined;
  readonly tone?: PopTone | undefined;
  /** Read out instead of the picture; without one it is decoration. */
  readonly label?: string | undefined;
};

const LINES: Record<PopTone, string> = {
  dye: 'text-dye',
  brass: 'text-brass-text',
  primer: 'text-primer',
  mark: 'text-on-dye forced-colors:text-[LinkText]',
  faint: 'text-ink-faint',
};

/**
 * The punch mark: a dot in a ring, hairlines through it. The tones differ in shape as well as colour:
 * solid dot, open dot, and dot cut out of a solid ring.
 */
export function CentrePop({ size = 24, tone = 'dye', label }: CentrePopProps) {
  return (
    <svg
      {...(label === undefined ? { 'aria-hidden': true } : { role: 'img', 'aria-label': label })}
      width={size}
      height={size}
      viewBox="-12 -12 24 24"
      className={joinClasses('shrink-0', LINES[tone])}
    >
      <path d="M-12 0H-7M7 0H12M0-12V-7M0 7V12" stroke="currentColor" strokeWidth="1" />
      <PopDot tone={tone} />
    </svg>
  );
}

/** The dot and its ring around 0,0, for use inside another drawing. Takes its colour from around it. */
export function PopDot({ tone }: { readonly tone: PopTone }) {
  if (tone === 'primer') {
    return (
      <>
        <circle r="6.5" fill="currentColor" />
        <circle r="2.5" className="fill-sheet" />
      </>
    );
  }
  return (
    <>
      <circle r="6" className={tone === 'mark' ? 'fill-none' : 'fill-sheet'} stroke="currentColor" />
      {tone === 'brass' ? (
        <circle r="2.75" fill="none" stroke="currentColor" strokeWidth="1.5" />
      ) : (
        <circle r="3" fill="currentColor" className={tone === 'mark' ? 'fill-brass' : undefined} />
      )}
    </>
  );
}
