import { joinClasses } from './join-classes.ts';

export type Check = {
  readonly text: string;
  readonly state: 'right' | 'wrong' | 'open';
  /** Where it can be put right. */
  readonly href?: string | undefined;
};

const STATES = {
  right: { said: 'Right:', look: 'text-verdigris', sign: 'M2 9l4 4L14 4' },
  wrong: { said: 'Not right:', look: 'text-primer', sign: 'M8 2v8M8 12.5v2' },
  open: { said: 'Still open:', look: 'text-ink-soft', sign: 'M3 8a5 5 0 1 0 10 0a5 5 0 1 0-10 0' },
};

/** What is in order and what is not, a line each. */
export function CheckList({ checks }: { readonly checks: readonly Check[] }) {
  return (
    <ul className="grid gap-2">
      {checks.map(({ text, state, href }) => (
        <li key={text} className="flex gap-3">
          <svg
            aria-hidden="true"
            width="16"
            height="16"
            className={joinClasses('mt-1 shrink-0', STATES[state].look)}
            fill="none"
            stroke="currentColor"
            strokeWidth="2"
          >
            <path d={STATES[state].sign} />
          </svg>
          <span>
            <span className="sr-only">{STATES[state].said} </span>
            {href === undefined ? (
              text
            ) : (
              <a href={href} className="link">
                {text}
              </a>
            )}
          </span>
        </li>
      ))}
    </ul>
  );
}
