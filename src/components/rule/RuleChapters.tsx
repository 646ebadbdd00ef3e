import { type RuleChapter } from './rule-data.ts';

type RuleChaptersProps = {
  /** In the order of time. */
  readonly chapters: readonly RuleChapter[];
  readonly length: number;
  readonly className: string;
  readonly quiet: boolean;
};

/** Chapter names under the rule, each as wide as its chapter and cut with an ellipsis when longer. */
export function RuleChapters({ chapters, length, className, quiet }: RuleChaptersProps) {
  if (chapters.length === 0) return null;
  const percent = (seconds: number) => `${String(Math.round((seconds / length) * 100_000) / 1000)}%`;
  const look = 'block truncate border-s border-line-strong ps-1.5 text-sm text-ink-soft';
  return (
    <svg
      height="24"
      className={className}
      aria-hidden={quiet || chapters.every(({ href }) => href === undefined)}
    >
      {chapters.map(({ at, label, href }, index) => (
        <foreignObject
          key={at}
          x={percent(at)}
          width={percent((chapters[index + 1]?.at ?? length) - at)}
          height="24"
        >
          {href === undefined ? (
            <span className={look}>{label}</span>
          ) : (
            <a
              href={href}
              tabIndex={quiet ? -1 : undefined}
              data-at={at}
              className={`${look} hover:text-dye hover:underline`}
            >
              {label}
            </a>
          )}
        </foreignObject>
      ))}
    </svg>
  );
}
