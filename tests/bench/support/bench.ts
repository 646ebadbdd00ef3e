/** One bench. Every file `tests/bench/*.bench.ts` exports one, under the name `bench`. */
export type Bench = {
  readonly name: string;
  /** What is compared with what, in a line. */
  readonly what: string;
  /**
   * Measures, prints its table, and ends everything that it started.
   * @returns whether what it holds the product to was reached
   */
  run(print: (line: string) => void): Promise<boolean>;
};

export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const middle = Math.floor(sorted.length / 2);
  const upper = sorted[middle] ?? Number.NaN;
  return sorted.length % 2 === 1 ? upper : ((sorted[middle - 1] ?? Number.NaN) + upper) / 2;
}

/** Lines of a table, its columns padded; numbers are set to the right. */
export function formatTable(rows: readonly (readonly (string | number)[])[]): string[] {
  const widths = rows.reduce<number[]>(
    (widest, row) => row.map((cell, at) => Math.max(widest[at] ?? 0, String(cell).length)),
    [],
  );
  return rows.map((row) =>
    row
      .map((cell, at) => {
        const text = String(cell);
        return typeof cell === 'number' || at > 0
          ? text.padStart(widths[at] ?? 0)
          : text.padEnd(widths[at] ?? 0);
      })
      .join('   '),
  );
}
