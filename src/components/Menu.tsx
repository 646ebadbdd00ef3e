import { type KeyboardEvent, useEffect, useId, useRef, useState } from 'react';
import { Button, type ButtonVariant } from './Button.tsx';
import { joinClasses } from './join-classes.ts';
import { findByLetters, nextIndex } from './next-index.ts';

export type MenuItem = {
  readonly label: string;
  readonly onSelect?: (() => void) | undefined;
  readonly href?: string | undefined;
  readonly danger?: boolean | undefined;
};

type MenuProps = {
  readonly label: string;
  readonly items: readonly MenuItem[];
  readonly variant?: ButtonVariant | undefined;
  /** The edge of the button it lines up with. */
  readonly align?: 'start' | 'end' | undefined;
};

/** A button that opens a list of things to do. */
export function Menu({ label, items, variant = 'plain', align = 'start' }: MenuProps) {
  const [open, setOpen] = useState(false);
  const [active, setActive] = useState(0);
  const root = useRef<HTMLDivElement>(null);
  const list = useRef<HTMLDivElement>(null);
  const id = useId();

  useEffect(() => {
    if (!open) return undefined;
    const closeOutside = (event: PointerEvent) => {
      if (event.target instanceof Node && root.current?.contains(event.target) !== true) setOpen(false);
    };
    document.addEventListener('pointerdown', closeOutside);
    return () => {
      document.removeEventListener('pointerdown', closeOutside);
    };
  }, [open]);

  useEffect(() => {
    if (open) list.current?.querySelectorAll<HTMLElement>('[role=menuitem]')[active]?.focus();
  }, [open, active]);

  function show(index: number) {
    setActive(index);
    setOpen(true);
  }

  function close() {
    setOpen(false);
    root.current?.querySelector('button')?.focus();
  }

  function onMenuKey(event: KeyboardEvent) {
    const labels = items.map((item) => item.label);
    const next = nextIndex(event.key, active, items.length, { back: 'ArrowUp', on: 'ArrowDown' });
    if (event.key === 'Escape') close();
    else if (event.key === 'Tab') {
      setOpen(false);
      return;
    } else if (next !== null) setActive(next);
    else if (/^\S$/.test(event.key)) setActive(Math.max(findByLetters(labels, event.key, active), 0));
    else return;
    event.preventDefault();
  }

  return (
    <div ref={root} className="relative inline-block">
      <Button
        variant={variant}
        aria-haspopup="menu"
        aria-expanded={open}
        aria-controls={open ? id : undefined}
        onClick={() => {
          if (open) setOpen(false);
          else show(0);
        }}
        onKeyDown={(event) => {
          if (event.key !== 'ArrowDown' && event.key !== 'ArrowUp') return;
          event.preventDefault();
          show(event.key === 'ArrowDown' ? 0 : items.length - 1);
        }}
      >
        {label}
        <svg aria-hidden="true" width="10" height="6" className="fill-current">
          <path d="M0 0H10L5 6Z" />
        </svg>
      </Button>
      {open && (
        <div
          ref={list}
          id={id}
          role="menu"
          tabIndex={-1}
          aria-label={label}
          onKeyDown={onMenuKey}
          className={joinClasses(
            'absolute top-full z-10 mt-1 min-w-full border border-ink bg-sheet py-1 whitespace-nowrap',
            align === 'start' ? 'start-0' : 'end-0',
          )}
        >
          {items.map((item, index) => (
            <MenuLine key={item.label} item={item} current={index === active} onDone={close} />
          ))}
        </div>
      )}
    </div>
  );
}

type MenuLineProps = { readonly item: MenuItem; readonly current: boolean; readonly onDone: () => void };

function MenuLine({ item, current, onDone }: MenuLineProps) {
  const look = joinClasses(
    'block w-full px-4 py-2 text-start hover:bg-dye-wash focus:bg-dye-wash',
    item.danger === true ? 'text-primer' : 'text-ink',
  );
  const shared = { role: 'menuitem', tabIndex: current ? 0 : -1, className: look };
  return item.href === undefined ? (
    <button
      {...shared}
      type="button"
      onClick={() => {
        onDone();
        item.onSelect?.();
      }}
    >
      {item.label}
    </button>
  ) : (
    <a {...shared} href={item.href}>
      {item.label}
    </a>
  );
}
