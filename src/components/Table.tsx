import { type ReactNode } from 'react';

export type TableColumn = {
  readonly key: string;
  readonly label: string;
  /** Figures: mono, set to the end so that they stand under each other. */
  readonly numeric?: boolean | undefined;
};

export type TableRow = {
  readonly id: string;
  readonly cells: Readonly<Record<string, ReactNode>>;
  readonly current?: boolean | undefined;
};

type TableProps = {
  /** What the table holds; it is also the name of its scrolling frame. */
  readonly caption: string;
  readonly hideCaption?: boolean | undefined;
  /** With columns and rows a narrow screen stacks each row; the first column heads its row. */
  readonly columns?: readonly TableColumn[] | undefined;
  readonly rows?: readonly TableRow[] | undefined;
  /** Said in the place of rows when there are none. */
  readonly empty?: ReactNode;
  /** A head and body of one's own (thead, tbody) instead; a narrow screen scrolls it sideways. */
  readonly children?: ReactNode;
};

/** A ruled table. */
export function Table({ caption, hideCaption = false, columns, rows = [], empty, children }: TableProps) {
  const head = <caption className={hideCaption ? 'sr-only' : undefined}>{caption}</caption>;
  if (columns === undefined) {
    return (
      // A frame that scrolls has to be reachable by keyboard.
      // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
      <section className="overflow-x-auto" aria-label={caption} tabIndex={0}>
        <table className="ruled-table">
          {head}
          {children}
        </table>
      </section>
    );
  }
  return (
    <table className="ruled-table" data-stack="">
      {head}
      <thead>
        <tr>
          {columns.map(({ key, label, numeric }) => (
            <th key={key} scope="col" data-numeric={numeric === true ? '' : undefined}>
              {label}
            </th>
          ))}
        </tr>
      </thead>
      <tbody>
        {rows.length === 0 && (
          <tr>
            <td colSpan={columns.length}>{empty ?? 'Nothing here yet.'}</td>
          </tr>
        )}
        {rows.map((row) => (
          <tr key={row.id} data-current={row.current === true ? '' : undefined}>
            {columns.map(({ key, label, numeric }, index) =>
              index === 0 ? (
                <th key={key} scope="row">
                  {row.cells[key]}
                </th>
              ) : (
                <td key={key} data-label={label} data-numeric={numeric === true ? '' : undefined}>
                  <span>{row.cells[key]}</span>
                </td>
              ),
            )}
          </tr>
        ))}
      </tbody>
    </table>
  );
}
