import { useQuery, useQueryClient } from '@tanstack/react-query';
import { type Dispatch, type SetStateAction, useCallback, useEffect, useMemo, useRef, useState } from 'react';
import { ApiError } from '../../../../client/call-api.ts';
import { type DeskLists } from '../../desk.ts';
import { deskQuery, type DeskOf, sendDeskChange } from '../../queries.ts';
import {
  noteConflict,
  noteGone,
  noteRefused,
  noteSaved,
  type Op,
  pendingOps,
  takeIn,
} from './desk-saving.ts';
import { type DeskState } from './desk-state.ts';
import { readKept, writeKept } from './kept-in-tab.ts';
import { type KeptRow, putBack, unsavedRows } from './unsaved-rows.ts';

/** Long enough that a run of typing is one save. */
const PAUSE_MS = 700;
const RETRY_MS = 4000;

export interface DeskSync {
  /** The row that is on its way. */
  readonly sending: string | null;
  /** The server cannot be reached; what was typed is kept. */
  readonly stalled: boolean;
  /** Saves at once what is still waiting for a pause. */
  readonly flush: () => void;
}

/** Keeps what is stored like the desk, one change at a time, and takes in what others stored. */
export function useDeskSync(
  of: DeskOf,
  initial: DeskLists,
  desk: DeskState,
  setDesk: Dispatch<SetStateAction<DeskState>>,
): DeskSync {
  const client = useQueryClient();
  const key = `desk-rows ${of.episode}`;
  const [sending, setSending] = useState<Op | null>(null);
  const [stalled, setStalled] = useState(false);
  const [hurry, setHurry] = useState(0);
  const hurried = useRef(0);
  const query = deskQuery(of);

  const { data } = useQuery({
    ...query,
    initialData: initial,
    enabled: sending === null,
    refetchOnMount: false,
  });
  const [seen, setSeen] = useState(data);
  if (data !== seen) {
    setSeen(data);
    setDesk((state) => takeIn(state, data));
  }

  // Once: what was not saved when this tab was last closed or loaded again.
  useEffect(() => {
    const kept = readKept<readonly KeptRow[]>(key);
    if (kept !== null) setDesk((state) => putBack(state, kept));
  }, [key, setDesk]);

  const unsaved = useMemo(() => unsavedRows(desk), [desk]);
  const first = useRef(true);
  useEffect(() => {
    // The very first look comes before what was kept has been put back.
    if (first.current) first.current = false;
    else writeKept(key, unsaved.length === 0 ? null : unsaved);
  }, [key, unsaved]);

  const [next] = useMemo(() => pendingOps(desk), [desk]);
  useEffect(() => {
    if (sending !== null || next === undefined) return undefined;
    const atOnce = hurry !== hurried.current || next.do !== 'change';
    const pause = stalled ? RETRY_MS : atOnce ? 0 : PAUSE_MS;
    const timer = setTimeout(() => {
      hurried.current = hurry;
      setSending(next);
    }, pause);
    return () => {
      clearTimeout(timer);
    };
  }, [next, sending, stalled, hurry]);

  useEffect(() => {
    if (sending === null) return;
    const op = sending;
    void send();
    async function send(): Promise<void> {
      // An answer from before the save would take it back on screen.
      await client.cancelQueries({ queryKey: deskQuery(of).queryKey });
      try {
        const answer = await sendDeskChange(of, op);
        setStalled(false);
        setDesk((state) => noteSaved(state, op, answer));
      } catch (error) {
        const lost = !(error instanceof ApiError) || error.status === 0 || error.status >= 500;
        setStalled(lost);
        if (lost) return;
        if (error.status === 404 && op.do === 'delete') setDesk((state) => noteGone(state, op));
        else if (error.status === 409) setDesk((state) => noteConflict(state, op, error.stored));
        else setDesk((state) => noteRefused(state, op, error.message, error.fields));
      } finally {
        setSending(null);
      }
    }
    // `of` is made once, with the desk.
  }, [sending, client, of, setDesk]);

  const open = unsaved.length > 0;
  useEffect(() => {
    if (!open) return undefined;
    const ask = (event: BeforeUnloadEvent) => {
      event.preventDefault();
    };
    globalThis.addEventListener('beforeunload', ask);
    return () => {
      globalThis.removeEventListener('beforeunload', ask);
    };
  }, [open]);

  const flush = useCallback(() => {
    setHurry((count) => count + 1);
  }, []);
  return { sending: sending?.id ?? null, stalled, flush };
}
