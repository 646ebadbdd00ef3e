import { QueryClientProvider } from '@tanstack/react-query';
import { type ReactNode, useCallback, useState } from 'react';
import { queryClient } from '../../../../client/query-client.ts';
import { type DeskData, readDeskData } from './desk-data.ts';
import { DeskTable } from './DeskTable.tsx';

type DeskProps = {
  /** The video as the page holds it. */
  readonly video?: ReactNode;
  /** Rule, notes and chapters as the page holds them, until a script has taken over. */
  readonly children?: ReactNode;
};

/** The desk's island. It reads its data from the page; without a script the page stays as it is. */
export function Desk({ video, children }: DeskProps) {
  const [data, setData] = useState<DeskData | null>(null);
  const readPage = useCallback((place: HTMLDivElement | null) => {
    if (place !== null) setData(readDeskData(document));
  }, []);
  if (data === null) {
    return (
      <div ref={readPage} className="grid gap-4">
        {children}
        <div className="max-w-2xl">{video}</div>
      </div>
    );
  }
  return (
    <QueryClientProvider client={queryClient()}>
      <DeskTable data={data} video={video} />
    </QueryClientProvider>
  );
}
