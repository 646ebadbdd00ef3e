import { useCallback, useEffect, useMemo, useState } from 'react';
import { v7 as uuidv7 } from 'uuid';
import { makeClock } from './clock.ts';
import { afterSaving, type Draft, EMPTY_DRAFT, isBegun, NO_MARKS, placeOfDraft } from './composer-draft.ts';
import { type DeskData } from './desk-data.ts';
import { type AnyRow, type Forms, type RowKind } from './desk-rows.ts';
import { addRow, deleteRow, type DeskState, editRow, endRun, startDesk } from './desk-state.ts';
import { readKept, writeKept } from './kept-in-tab.ts';
import { type Desk, type DeskTools } from './use-desk.ts';
import { useDeskSync } from './use-desk-sync.ts';

const NAMES = { note: 'note', chapter: 'chapter', appearance: 'part on the bench' };

/** The desk of an episode: its rows and what is being done with them. */
export function useDeskTable(data: DeskData): {
  /** The same object for as long as nothing in it changes. */
  readonly tools: DeskTools;
  readonly desk: Desk;
  readonly said: string;
} {
  const [state, setState] = useState(() => startDesk(data));
  const [clock] = useState(() => makeClock(data.rate, data.length));
  const [marks, setMarks] = useState(NO_MARKS);
  const [marked, mark] = useState<string | null>(null);
  const [editing, setEditing] = useState<string | null>(null);
  const [said, setSaid] = useState('');
  const { draft, setDraft } = useDraft(data.episode);
  const { sending, stalled, flush } = useDeskSync(data, data, state, setState);

  const add = useCallback(<K extends RowKind>(what: K, form: Forms[K]) => {
    const id = uuidv7();
    setState((before) => addRow(before, { what, id, form }, `Add a ${NAMES[what]}`));
    return id;
  }, []);
  const edit = useCallback<Desk['edit']>((id, fields, what, run) => {
    setState((before) => editRow(before, id, fields, what, run ?? null));
  }, []);

  const remove = useCallback(({ id, what }: AnyRow) => {
    setState((before) => deleteRow(before, id, `Delete a ${NAMES[what]}`));
    setEditing((open) => (open === id ? null : open));
    setSaid(`The ${NAMES[what]} is deleted. Ctrl Z, or Undo, brings it back.`);
  }, []);
  const leave = useCallback(() => {
    setState(endRun);
    flush();
  }, [flush]);
  const change = useCallback((next: (state: DeskState) => DeskState) => {
    setState(next);
    setSaid('');
  }, []);
  const saveDraft = useCallback(() => {
    const { at: _at, ...fields } = draft;
    const position = placeOfDraft(draft, marks, clock.now(), clock.rate);
    const askedId = fields.audience === 'person' ? fields.askedId : null;
    mark(add('note', { ...fields, askedId, partIds: [...fields.partIds], position }));
    setDraft(afterSaving);
    setMarks(NO_MARKS);
    setSaid('');
  }, [draft, marks, clock, add, setDraft]);
  const tools = useMemo(
    (): DeskTools => ({
      ...{ data, clock, sending, stalled, marks, setMarks, setDraft, marked, mark },
      ...{ editing, setEditing, add, edit, remove, leave, change },
    }),
    [data, clock, sending, stalled, marks, setDraft, marked, editing, add, edit, remove, leave, change],
  );
  return { tools, desk: { ...tools, state, draft, saveDraft }, said };
}

/** What is being written, kept in this tab over a reload. */
function useDraft(episode: string) {
  const key = `desk-draft ${episode}`;
  const [draft, setDraft] = useState<Draft>(() => readKept<Draft>(key) ?? EMPTY_DRAFT);
  useEffect(() => {
    writeKept(key, isBegun(draft) ? draft : null);
  }, [key, draft]);
  return useMemo(() => ({ draft, setDraft }), [draft]);
}
