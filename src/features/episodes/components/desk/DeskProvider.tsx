import { type ReactNode, useMemo } from 'react';
import { type Desk, DeskContexts, type DeskTools } from './use-desk.ts';

type DeskProviderProps = {
  readonly desk: Desk;
  /** The same object for as long as nothing in it changes. */
  readonly tools: DeskTools;
  readonly children: ReactNode;
};

/** Gives a desk to the pieces inside. */
export function DeskProvider({ desk: { state, draft, saveDraft }, tools, children }: DeskProviderProps) {
  const written = useMemo(() => ({ draft, saveDraft }), [draft, saveDraft]);
  return (
    <DeskContexts.Tools value={tools}>
      <DeskContexts.State value={state}>
        <DeskContexts.Draft value={written}>{children}</DeskContexts.Draft>
      </DeskContexts.State>
    </DeskContexts.Tools>
  );
}
