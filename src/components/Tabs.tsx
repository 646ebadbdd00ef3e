import { type ReactNode, useId, useRef, useState } from 'react';
import { nextIndex } from './next-index.ts';
import { useHydrated } from './use-hydrated.ts';

export type Tab = { readonly id: string; readonly label: string; readonly content: ReactNode };

type TabsProps = {
  readonly label: string;
  readonly tabs: readonly Tab[];
  readonly initial?: string | undefined;
};

const LOOK =
  '-mb-px border border-b-0 px-4 py-2 font-bold aria-selected:border-ink aria-selected:bg-sheet ' +
  'border-transparent text-dye aria-selected:text-ink hover:bg-dye-wash';

/** Sheets behind each other. Without a script they lie one under the other, and the tabs lead to them. */
export function Tabs({ label, tabs, initial }: TabsProps) {
  const [current, setCurrent] = useState(initial ?? tabs[0]?.id);
  const list = useRef<HTMLDivElement>(null);
  const hydrated = useHydrated();
  const base = useId();
  const panelId = (id: string) => `${base}-${id}`;

  if (!hydrated) {
    return (
      <div>
        <nav aria-label={label} className="flex flex-wrap border-b border-ink">
          {tabs.map((tab) => (
            <a key={tab.id} href={`#${panelId(tab.id)}`} className={LOOK}>
              {tab.label}
            </a>
          ))}
        </nav>
        {tabs.map((tab) => (
          <section key={tab.id} id={panelId(tab.id)} aria-label={tab.label} className="pt-4">
            {tab.content}
          </section>
        ))}
      </div>
    );
  }

  return (
    <div>
      <div
        ref={list}
        role="tablist"
        tabIndex={-1}
        aria-label={label}
        className="flex flex-wrap border-b border-ink"
        onKeyDown={(event) => {
          const at = tabs.findIndex(({ id }) => id === current);
          const next = nextIndex(event.key, at, tabs.length, { back: 'ArrowLeft', on: 'ArrowRight' });
          if (next === null) return;
          event.preventDefault();
          setCurrent(tabs[next]?.id);
          list.current?.querySelectorAll<HTMLElement>('[role=tab]')[next]?.focus();
        }}
      >
        {tabs.map((tab) => (
          <button
            key={tab.id}
            type="button"
            role="tab"
            id={`${panelId(tab.id)}-tab`}
            aria-selected={tab.id === current}
            aria-controls={panelId(tab.id)}
            tabIndex={tab.id === current ? 0 : -1}
            className={LOOK}
            onClick={() => {
              setCurrent(tab.id);
            }}
          >
            {tab.label}
          </button>
        ))}
      </div>
      {tabs.map((tab) => (
        <div
          key={tab.id}
          role="tabpanel"
          id={panelId(tab.id)}
          aria-labelledby={`${panelId(tab.id)}-tab`}
          // A panel may hold nothing that takes focus, and Tab has to lead from the tab into it.
          // eslint-disable-next-line jsx-a11y/no-noninteractive-tabindex
          tabIndex={0}
          hidden={tab.id !== current}
          className="pt-4"
        >
          {tab.content}
        </div>
      ))}
    </div>
  );
}
