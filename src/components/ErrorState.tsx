import { type ReactNode } from 'react';
import { ToneGlyph } from './ToneGlyph.tsx';

type ErrorStateProps = {
  /** What happened. */
  readonly title: string;
  /** What was kept. */
  readonly kept?: string | undefined;
  /** What to do: a button or a link. */
  readonly action?: ReactNode;
  readonly level?: 1 | 2 | 3 | undefined;
  readonly children?: ReactNode;
};

/** Something went wrong: what happened, what was kept, what to do. */
export function ErrorState({ title, kept, action, level = 2, children }: ErrorStateProps) {
  const Heading = `h${String(level)}` as 'h1' | 'h2' | 'h3';
  return (
    <section role="alert" className="grid justify-items-start gap-3 border border-primer bg-sheet px-6 py-6">
      <Heading className="flex items-start gap-3 text-lg text-primer">
        <span className="pt-0.5">
          <ToneGlyph tone="error" />
        </span>
        {title}
      </Heading>
      {children != null && <div className="max-w-prose">{children}</div>}
      {kept !== undefined && (
        <p className="flex max-w-prose gap-3 text-ink-soft">
          <span className="text-verdigris">
            <ToneGlyph tone="done" />
          </span>
          {kept}
        </p>
      )}
      {action != null && <div className="flex flex-wrap gap-2 pt-1">{action}</div>}
    </section>
  );
}
