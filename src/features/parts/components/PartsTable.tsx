import { QueryClientProvider } from '@tanstack/react-query';
import { type ReactNode, useCallback, useState } from 'react';
import { queryClient } from '../../../client/query-client.ts';
import { type Part } from '../part.ts';
import { PartsGrid } from './PartsGrid.tsx';
import { readPageParts } from './read-page-parts.ts';

type PartsTableProps = {
  readonly workshop: string;
  readonly build: string;
  /** The list as the page holds it; it is read, and the table takes its place. */
  readonly children?: ReactNode;
};

/** The parts list as a table that is typed in. Without a script the list stays as it is. */
export function PartsTable({ workshop, build, children }: PartsTableProps) {
  const [parts, setParts] = useState<readonly Part[] | null>(null);
  const readList = useCallback((list: HTMLDivElement | null) => {
    if (list !== null) setParts(readPageParts(list));
  }, []);
  if (parts === null) return <div ref={readList}>{children}</div>;
  return (
    <QueryClientProvider client={queryClient()}>
      <PartsGrid of={{ workshop, build }} initial={parts} />
    </QueryClientProvider>
  );
}
