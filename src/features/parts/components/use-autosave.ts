import { useMutation, useQuery, useQueryClient } from '@tanstack/react-query';
import { type Dispatch, type SetStateAction, useEffect, useMemo, useState } from 'react';
import { ApiError } from '../../../client/call-api.ts';
import { type Part, type PartChange } from '../part.ts';
import { type PartsOf, partsQuery, savePartsMutation } from '../queries.ts';
import { noteConflicts, noteRefused, noteSaved, pendingChanges, takeIn } from './parts-table-saving.ts';
import { type TableState } from './parts-table-state.ts';

/** Long enough that a run of quick edits is one save. */
const PAUSE_MS = 300;
const RETRY_MS = 5_000;

export interface Autosave {
  /** The rows that are on their way. */
  readonly sending: ReadonlySet<string>;
  /** Why nothing can be saved at the moment. */
  readonly stalled: string | null;
}

/** Keeps what is stored like the table, a save at a time, and takes in what others stored. */
export function useAutosave(
  of: PartsOf,
  initial: readonly Part[],
  table: TableState,
  setTable: Dispatch<SetStateAction<TableState>>,
): Autosave {
  const client = useQueryClient();
  const [stalled, setStalled] = useState<string | null>(null);
  const query = partsQuery(of);
  const { mutate, isPending, variables } = useMutation({
    ...savePartsMutation(of),
    onMutate: async () => {
      // An answer from before the save would take it back on screen.
      await client.cancelQueries({ queryKey: query.queryKey });
    },
    onSuccess: (saved: readonly Part[], sent: readonly PartChange[]) => {
      setStalled(null);
      setTable((state) => noteSaved(state, sent, saved));
    },
    onError: (error: Error, sent: readonly PartChange[]) => {
      if (!(error instanceof ApiError) || error.status === 0 || error.status >= 500) {
        setStalled(
          'The server does not answer. What you typed is kept here and tried again every few seconds.',
        );
      } else if (error.status === 409) {
        const { parts } = error.stored as { parts: readonly (Part & { deleted: boolean })[] };
        setTable((state) => noteConflicts(state, parts));
      } else {
        setTable((state) => noteRefused(state, sent, error.fields, error.message));
      }
    },
  });

  const { data } = useQuery({ ...query, initialData: initial, enabled: !isPending, refetchOnMount: false });
  const [seen, setSeen] = useState(data);
  if (data !== seen) {
    setSeen(data);
    setTable((state) => takeIn(state, data));
  }

  const pending = useMemo(() => pendingChanges(table), [table]);
  useEffect(() => {
    if (isPending || pending.length === 0) return undefined;
    const timer = setTimeout(
      () => {
        mutate(pending);
      },
      stalled === null ? PAUSE_MS : RETRY_MS,
    );
    return () => {
      clearTimeout(timer);
    };
  }, [pending, isPending, stalled, mutate]);

  useEffect(() => {
    if (!isPending && pending.length === 0) return undefined;
    const ask = (event: BeforeUnloadEvent) => {
      event.preventDefault();
    };
    globalThis.addEventListener('beforeunload', ask);
    return () => {
      globalThis.removeEventListener('beforeunload', ask);
    };
  }, [pending, isPending]);

  const sending = useMemo(
    () => new Set(isPending && variables ? variables.map(({ id }) => id) : []),
    [isPending, variables],
  );
  return { sending, stalled };
}
