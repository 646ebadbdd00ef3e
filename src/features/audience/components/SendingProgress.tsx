import { QueryClientProvider, useQuery } from '@tanstack/react-query';
import { useEffect, useMemo } from 'react';
import { Progress } from '../../../components/Progress.tsx';
import { queryClient } from '../../../client/query-client.ts';
import { progressQuery } from '../queries.ts';
import { countDone, describeProgress } from './describe-progress.ts';

/** Follows an announcement while it is being sent; when it is done the page is shown anew. */
export function SendingProgress({ path }: { readonly path: string }) {
  return (
    <QueryClientProvider client={queryClient()}>
      <Following path={path} />
    </QueryClientProvider>
  );
}

function Following({ path }: { readonly path: string }) {
  const query = useMemo(() => progressQuery(path), [path]);
  const { data } = useQuery(query);
  const over = data !== undefined && data.state !== 'sending';
  useEffect(() => {
    // Its buttons are other ones now.
    if (over) window.location.reload();
  }, [over]);
  if (data === undefined) return <p className="text-ink-soft">Asking how far it is.</p>;
  return (
    <Progress
      label="Sending"
      value={countDone(data)}
      max={Math.max(1, data.total)}
      detail={describeProgress(data)}
    />
  );
}
