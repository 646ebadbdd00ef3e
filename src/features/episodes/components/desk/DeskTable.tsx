import { type ReactNode, useCallback, useEffect, useRef, useState } from 'react';
import { Button } from '../../../../components/Button.tsx';
import { Notice } from '../../../../components/Notice.tsx';
import { BENCH_PART, BenchPanel } from './BenchPanel.tsx';
import { ChapterPanel } from './ChapterPanel.tsx';
import { Composer, COMPOSER } from './Composer.tsx';
import { isBegun } from './composer-draft.ts';
import { type DeskData } from './desk-data.ts';
import { markOf } from './desk-saving.ts';
import { type AnyRow } from './desk-rows.ts';
import { redo, undo } from './desk-state.ts';
import { DeskRule } from './DeskRule.tsx';
import { KeysPanel } from './KeysPanel.tsx';
import { NoteList } from './NoteList.tsx';
import { NotInEdit } from './NotInEdit.tsx';
import { runCommand } from './run-command.ts';
import { Transport } from './Transport.tsx';
import { DeskProvider } from './DeskProvider.tsx';
import { type Desk } from './use-desk.ts';
import { useDeskKeys } from './use-desk-keys.ts';
import { useDeskTable } from './use-desk-table.ts';
import { usePlayer } from './use-player.ts';
import { useSingleKeys } from './use-single-keys.ts';

type DeskTableProps = {
  readonly data: DeskData;
  /** The video as the page holds it. */
  readonly video: ReactNode;
};

/** The desk at work: rule, video, composer, notes, chapters and bench, with every key. */
export function DeskTable({ data, video }: DeskTableProps) {
  const { tools, desk, said } = useDeskTable(data);
  const { clock } = desk;
  const place = useRef<HTMLDivElement>(null);
  const [sheet, setSheet] = useState(false);
  const [keys, setKeys] = useState(false);
  const [wanted, setWanted] = useState<string | null>(null);
  const { singles, setSingles } = useSingleKeys();
  usePlayer(place, clock);

  useEffect(() => {
    // After rendering, because the field may have come only now. Once a wish.
    if (wanted === null) return;
    document.getElementById(wanted.split(' ')[0] ?? '')?.focus();
  }, [wanted]);
  const focus = useCallback((id: string) => {
    setWanted(`${id} ${String(performance.now())}`);
  }, []);

  const { add } = tools;
  const addChapter = useCallback(() => {
    const position = { frame: clock.now(), endFrame: null, rate: clock.rate };
    clock.player()?.pause();
    focus(`chapter-${add('chapter', { title: '', position })}`);
  }, [add, clock, focus]);

  function openComposer(): void {
    setSheet(true);
    focus(`${COMPOSER}-text`);
  }

  useDeskKeys(singles, (command) => {
    runCommand(command, desk, {
      openComposer,
      addChapter,
      toBench: () => {
        focus(BENCH_PART);
      },
      toNote: (id) => {
        document.getElementById(`note-${id}`)?.scrollIntoView({ block: 'nearest' });
      },
      toggleKeys: () => {
        setKeys((open) => !open);
      },
    });
  });

  return (
    <DeskProvider desk={desk} tools={tools}>
      <div className="grid gap-4 pb-16 lg:pb-0">
        {desk.stalled && (
          <Notice tone="error" live title="No connection.">
            What you typed is kept in this tab, and saved as soon as the server answers.
          </Notice>
        )}
        <DeskRule />
        <Transport />
        <DeskActions
          desk={desk}
          said={said}
          onKeys={() => {
            setKeys(true);
          }}
        />
        <div className="grid items-start gap-4 lg:grid-cols-[minmax(0,5fr)_minmax(0,8fr)]">
          <div className="grid gap-4">
            <div ref={place}>{video}</div>
            {data.mayChange && (
              <Composer
                open={sheet}
                onClose={() => {
                  setSheet(false);
                }}
              />
            )}
          </div>
          <div className="grid gap-4">
            <NoteList />
            <NotInEdit />
            <ChapterPanel onAdd={addChapter} />
            <BenchPanel />
          </div>
        </div>
        {data.mayChange && !sheet && (
          <div className="fixed inset-x-0 bottom-0 z-10 border-t border-ink bg-sheet p-2 lg:hidden">
            <Button
              variant="primary"
              wide
              onClick={() => {
                runCommand({ do: 'note' }, desk, noteOnly(openComposer));
              }}
            >
              {isBegun(desk.draft) ? 'Go on writing the note' : 'Note at this moment'}
            </Button>
          </div>
        )}
      </div>
      <KeysPanel
        open={keys}
        onClose={() => {
          setKeys(false);
        }}
        singles={singles}
        onSingles={setSingles}
      />
    </DeskProvider>
  );
}

const nothing = () => undefined;

/** For a button that only begins a note. */
function noteOnly(openComposer: () => void) {
  return { openComposer, addChapter: nothing, toBench: nothing, toNote: nothing, toggleKeys: nothing };
}

type DeskActionsProps = { readonly desk: Desk; readonly said: string; readonly onKeys: () => void };

function DeskActions({ desk: { data, state, change, stalled }, said, onKeys }: DeskActionsProps) {
  const [back, on] = [state.done.at(-1), state.undone.at(-1)];
  return (
    <div className="flex flex-wrap items-center gap-2">
      {data.mayChange && (
        <>
          <Button
            size="small"
            disabled={back === undefined}
            onClick={() => {
              change(undo);
            }}
          >
            Undo{back !== undefined && `: ${back.said.toLowerCase()}`}
          </Button>
          <Button
            size="small"
            disabled={on === undefined}
            onClick={() => {
              change(redo);
            }}
          >
            Do again{on !== undefined && `: ${on.said.toLowerCase()}`}
          </Button>
        </>
      )}
      <Button size="small" onClick={onKeys}>
        Keys
      </Button>
      <p role="status" className="ms-auto text-sm text-ink-soft">
        {said} {data.mayChange && saySaved(state.rows, stalled)}
      </p>
    </div>
  );
}

function saySaved(rows: readonly AnyRow[], stalled: boolean): string {
  const marks = new Set(rows.map(markOf));
  if (marks.has('waiting')) return stalled ? 'Not saved.' : 'Saving …';
  return marks.has('open') || marks.has('conflict') ? 'Not everything is saved.' : 'Everything is saved.';
}
