import { type KeyboardEvent, useId, useRef, useState } from 'react';
import { describeField, FieldFrame, fieldId, INPUT_LOOK } from './FieldFrame.tsx';
import { matchOptions } from './match-options.ts';
import { nextIndex } from './next-index.ts';
import { Select, type SelectOption } from './Select.tsx';
import { useHydrated } from './use-hydrated.ts';

export type ComboboxProps = {
  readonly label: string;
  readonly name: string;
  readonly options: readonly SelectOption[];
  readonly id?: string | undefined;
  readonly value?: string | undefined;
  readonly hint?: string | undefined;
  readonly error?: string | undefined;
  readonly required?: boolean | undefined;
  readonly onChange?: ((value: string) => void) | undefined;
};

/** A list to choose one from by typing part of it. A native list until the browser has taken over. */
export function Combobox(props: ComboboxProps) {
  const hydrated = useHydrated();
  const { onChange: _onChange, ...plain } = props;
  const none = { value: '', label: 'None chosen' };
  return hydrated ? <TypeAhead {...props} /> : <Select {...plain} options={[none, ...props.options]} />;
}

function TypeAhead(props: ComboboxProps) {
  const {
    label,
    name,
    options,
    id = fieldId(name),
    value = '',
    hint,
    error,
    required = false,
    onChange,
  } = props;
  const [chosen, setChosen] = useState(value);
  const labelOf = (wanted: string) => options.find((option) => option.value === wanted)?.label ?? '';
  const [text, setText] = useState(labelOf(value));
  const [open, setOpen] = useState(false);
  const [active, setActive] = useState(-1);
  const list = useRef<HTMLDivElement>(null);
  const base = useId();
  const optionId = (index: number) => `${base}-${String(index)}`;
  // Opened on what is already chosen, it shows everything; only what is typed narrows it.
  const matches = text === labelOf(chosen) ? options : matchOptions(options, text);

  function choose(option: SelectOption | undefined) {
    const next = option?.value ?? '';
    setChosen(next);
    setText(option?.label ?? '');
    setOpen(false);
    setActive(-1);
    if (next !== chosen) onChange?.(next);
  }

  function move(index: number) {
    setOpen(true);
    setActive(index);
    list.current?.children[index]?.scrollIntoView({ block: 'nearest' });
  }

  function onKey(event: KeyboardEvent) {
    const arrow = event.key === 'ArrowDown' || event.key === 'ArrowUp';
    const next = arrow
      ? nextIndex(event.key, active, matches.length, { back: 'ArrowUp', on: 'ArrowDown' })
      : null;
    if (event.altKey && arrow) setOpen(event.key === 'ArrowDown');
    else if (next !== null) move(next);
    else if (event.key === 'Enter' && open && active >= 0) choose(matches[active]);
    else if (event.key === 'Escape' && open) {
      setOpen(false);
      setActive(-1);
    } else if (event.key === 'Escape' && text !== '') choose(undefined);
    else return;
    event.preventDefault();
  }

  function onLeave() {
    const exact = options.find((option) => option.label.toLowerCase() === text.trim().toLowerCase());
    if (text.trim() === '') choose(undefined);
    else if (exact !== undefined) choose(exact);
    else setText(labelOf(chosen));
    setOpen(false);
  }

  return (
    <FieldFrame id={id} label={label} hint={hint} error={error} required={required}>
      <div className="relative">
        <input type="hidden" name={name} value={chosen} />
        <input
          {...describeField(id, hint, error)}
          id={id}
          role="combobox"
          aria-expanded={open}
          aria-controls={`${base}-list`}
          aria-autocomplete="list"
          aria-activedescendant={open && active >= 0 ? optionId(active) : undefined}
          aria-required={required}
          autoComplete="off"
          value={text}
          className={INPUT_LOOK}
          onChange={(event) => {
            setText(event.target.value);
            setOpen(true);
            setActive(-1);
          }}
          onClick={() => {
            setOpen(true);
          }}
          onBlur={onLeave}
          onKeyDown={onKey}
        />
        <div
          ref={list}
          id={`${base}-list`}
          role="listbox"
          tabIndex={-1}
          aria-label={label}
          hidden={!open}
          className="absolute inset-x-0 top-full z-10 max-h-72 overflow-y-auto border border-t-0 border-ink bg-sheet"
        >
          {matches.map((option, index) => (
            // Chosen from the input by keyboard; a press must not take focus out of it first.
            // eslint-disable-next-line jsx-a11y/click-events-have-key-events
            <div
              key={option.value}
              id={optionId(index)}
              role="option"
              tabIndex={-1}
              aria-selected={option.value === chosen}
              data-active={index === active ? '' : undefined}
              className="flex justify-between gap-4 border-s-4 border-transparent px-3 py-2 hover:bg-dye-wash aria-selected:font-bold data-active:border-brass data-active:bg-dye-wash"
              onMouseDown={(event) => {
                event.preventDefault();
              }}
              onClick={() => {
                choose(option);
              }}
            >
              <span>{option.label}</span>
              {option.detail !== undefined && <span className="text-ink-soft">{option.detail}</span>}
            </div>
          ))}
        </div>
        <p role="status" className="text-sm text-ink-soft">
          {open && matches.length === 0 ? `Nothing here with “${text.trim()}” in it.` : ''}
        </p>
      </div>
    </FieldFrame>
  );
}
