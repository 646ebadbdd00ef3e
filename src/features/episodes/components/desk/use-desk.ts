import { createContext, useContext, useSyncExternalStore } from 'react';
import { type DeskClock } from './clock.ts';
import { type Draft, type Marks } from './composer-draft.ts';
import { type DeskData } from './desk-data.ts';
import { type AnyRow, type Forms, type RowKind } from './desk-rows.ts';
import { type DeskState } from './desk-state.ts';

/** What the pieces of the desk share, but for its rows and what is being written: it changes seldom. */
export interface DeskTools {
  readonly data: DeskData;
  readonly clock: DeskClock;
  readonly sending: string | null;
  readonly stalled: boolean;
  readonly marks: Marks;
  readonly setMarks: (marks: Marks) => void;
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
}

/** The note that is being written. */
export interface DeskDraft {
  readonly draft: Draft;
  readonly saveDraft: () => void;
}

export interface Desk extends DeskTools, DeskDraft {
  readonly state: DeskState;
}

// Three, so that a key that is pressed in a field renders that field, and not five hundred rows.
const ToolsContext = createContext<DeskTools | null>(null);
const StateContext = createContext<DeskState | null>(null);
const DraftContext = createContext<DeskDraft | null>(null);
export const DeskContexts = { Tools: ToolsContext, State: StateContext, Draft: DraftContext };

function present<Value>(value: Value | null): Value {
  if (value === null) throw new Error('This belongs on a desk.');
  return value;
}

/** The desk around a piece of it. */
export function useDesk(): DeskTools {
  return present(useContext(ToolsContext));
}

/** Its rows. */
export function useDeskState(): DeskState {
  return present(useContext(StateContext));
}

export function useDeskDraft(): DeskDraft {
  return present(useContext(DraftContext));
}

/** Something of the clock, for pieces that change with it; `pick` must give a plain value. */
export function useClock<Value>(clock: DeskClock, pick: (clock: DeskClock) => Value): Value {
  return useSyncExternalStore(
    clock.subscribe,
    () => pick(clock),
    () => pick(clock),
  );
}
