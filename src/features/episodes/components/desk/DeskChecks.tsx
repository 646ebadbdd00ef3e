import { QueryClientProvider, useQuery } from '@tanstack/react-query';
import { type ReactNode, useCallback, useState } from 'react';
import { queryClient } from '../../../../client/query-client.ts';
import { CheckList } from '../../../../components/CheckList.tsx';
import { deskQuery } from '../../queries.ts';
import { checkLines } from './check-lines.ts';
import { type DeskData, readDeskData } from './desk-data.ts';

type DeskChecksProps = {
  /** The checks as the page holds them, until a script has taken over. */
  readonly children?: ReactNode;
};

/** The checks before publishing, as the server last said them: they follow what is written on the desk. */
export function DeskChecks({ children }: DeskChecksProps) {
  const [data, setData] = useState<DeskData | null>(null);
  const readPage = useCallback((place: HTMLDivElement | null) => {
    if (place !== null) setData(readDeskData(document));
  }, []);
  if (data === null) return <div ref={readPage}>{children}</div>;
  return (
    <QueryClientProvider client={queryClient()}>
      <FollowedChecks data={data} />
    </QueryClientProvider>
  );
}

function FollowedChecks({ data }: { readonly data: DeskData }) {
  // The desk asks; here only what it was told is shown.
  const {
    data: { checks },
  } = useQuery({ ...deskQuery(data), initialData: data, enabled: false });
  return <CheckList checks={checkLines(checks)} />;
}
