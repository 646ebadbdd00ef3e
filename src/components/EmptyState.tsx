import { type ReactNode } from 'react';
import { CentrePop } from './CentrePop.tsx';

type EmptyStateProps = {
  /** What goes here. */
  readonly title: string;
  /** The button or link that starts it. */
  readonly action?: ReactNode;
  readonly level?: 2 | 3 | undefined;
  readonly children?: ReactNode;
};

/** A place with nothing in it yet: it says what goes there and starts it. */
export function EmptyState({ title, action, level = 2, children }: EmptyStateProps) {
  const Heading = `h${String(level)}` as 'h2' | 'h3';
  return (
    <section className="grid justify-items-start gap-3 border border-dashed border-line-strong px-6 py-8">
      <CentrePop size={32} tone="faint" />
      <Heading className="text-lg">{title}</Heading>
      {children != null && <div className="max-w-prose text-ink-soft">{children}</div>}
      {action != null && <div className="flex flex-wrap gap-2 pt-1">{action}</div>}
    </section>
  );
}
