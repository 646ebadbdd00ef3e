type DimensionLineProps = {
  /** The size in millimetres, with its unit: "412 mm". */
  readonly mm?: string | undefined;
  /** The size in inches, with its unit: "1 1/2 in". */
  readonly inch?: string | undefined;
  /** The system it was given in, which comes first. */
  readonly given?: 'mm' | 'inch' | undefined;
  /** What governs: said for assistive tech and on hover. */
  readonly origin?: 'plan' | 'as made' | 'as said' | undefined;
};

/**
 * A size between arrow ends. Both systems are in the page; `data-units` on any element around it picks one, and the
 * second stands in brackets when both are asked for, as on a dual-dimensioned drawing.
 */
export function DimensionLine({ mm, inch, given = 'mm', origin }: DimensionLineProps) {
  const forms = [
    { unit: 'mm', text: mm },
    { unit: 'inch', text: inch },
  ].filter(({ text }) => text !== undefined);
  const ordered = given === 'mm' ? forms : forms.toReversed();
  return (
    <span
      className="dimension inline-flex max-w-full items-center gap-1 align-baseline font-mono text-[0.95em] font-semibold"
      data-forms={ordered.length === 2 ? 'both' : 'one'}
      title={origin}
    >
      <ArrowEnd side="start" />
      <span>
        {ordered.map(({ unit, text }, index) => (
          <span key={unit} data-unit={unit}>
            {index > 0 && <span data-bracket=""> [</span>}
            {text}
            {index > 0 && <span data-bracket="">]</span>}
          </span>
        ))}
      </span>
      {origin !== undefined && <span className="sr-only">, {origin}</span>}
      <ArrowEnd side="end" />
    </span>
  );
}

function ArrowEnd({ side }: { readonly side: 'start' | 'end' }) {
  return (
    <svg aria-hidden="true" width="20" height="11" viewBox="0 0 20 11" className="shrink-0">
      <g
        transform={side === 'end' ? 'matrix(-1 0 0 1 20 0)' : undefined}
        className="fill-current stroke-current"
      >
        <path d="M0.5 0V11M1 5.5H20" />
        <path d="M1 5.5L8 3.7V7.3Z" stroke="none" />
      </g>
    </svg>
  );
}
