import { createContext, useContext, useSyncExternalStore } from 'react';
import { type DeskClock } from './clock.ts';
import { type Draft, type Marks } from './composer-draft.ts';
import { type DeskData } from './desk-data.ts';
import { type AnyRow, type Forms, type RowKind } from './desk-rows.ts';
import { type DeskState } from './desk-state.ts';

/** Everything that the pieces of the desk share. */
export interface Desk {
  readonly data: DeskData;
  readonly clock: DeskClock;
  readonly state: DeskState;
  readonly sending: string | null;
  readonly stalled: boolean;
  readonly marks: Marks;
  readonly setMarks: (marks: Marks) => void;
  readonly draft: Draft;
  readonly setDraft: (change: (draft: Draft) => Draft) => void;
  /** The note that keys act on. */
  readonly marked: string | null;
  readonly mark: (id: string | null) => void;
  /** The note that is open for changing. */
  readonly editing: string | null;
  readonly setEditing: (id: string | null) => void;
  readonly add: <K extends RowKind>(what: K, form: Forms[K]) => string;
  readonly edit: (
    id: string,
    fields: Readonly<Partial<Forms['note'] & Forms['chapter']>>,
    said: string,
    run?: string,
  ) => void;
  readonly remove: (row: AnyRow) => void;
  /** A field is left: what it holds is one step, and is saved at once. */
  readonly leave: () => void;
  readonly change: (next: (state: DeskState) => DeskState) => void;
  readonly saveDraft: () => void;
}

const DeskContext = createContext<Desk | null>(null);
export const DeskProvider = DeskContext.Provider;

/** The desk around a piece of it. */
export function useDesk(): Desk {
  const desk = useContext(DeskContext);
  if (desk === null) throw new Error('This belongs on a desk.');
  return desk;
}

/** Something of the clock, for pieces that change with it; `pick` must give a plain value. */
export function useClock<Value>(clock: DeskClock, pick: (clock: DeskClock) => Value): Value {
  return useSyncExternalStore(
    clock.subscribe,
    () => pick(clock),
    () => pick(clock),
  );
}
