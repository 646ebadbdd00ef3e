import { useEffect, useRef } from 'react';
import { Balloon } from '../../../../components/Balloon.tsx';
import { Combobox } from '../../../../components/Combobox.tsx';
import { type DeskPart } from './desk-data.ts';

type PartsFieldProps = {
  /** Made part of every id in it. */
  readonly name: string;
  readonly parts: readonly DeskPart[];
  readonly chosen: readonly string[];
  readonly error?: string | undefined;
  readonly onChange: (ids: readonly string[]) => void;
};

/** Several parts, each found by typing its number or its name. */
export function PartsField({ name, parts, chosen, error, onChange }: PartsFieldProps) {
  const place = useRef<HTMLDivElement>(null);
  const added = useRef(false);
  const byId = new Map(parts.map((part) => [part.id, part]));

  useEffect(() => {
    // The field begins anew after each choice; whoever chose goes on typing.
    if (added.current) place.current?.querySelector('input[role=combobox]')?.closest('input')?.focus();
    added.current = false;
  }, [chosen.length]);

  return (
    <div ref={place} className="grid gap-2">
      {/* Enter takes what has been typed in full; the list's own keys come first. */}
      {/* eslint-disable-next-line jsx-a11y/no-static-element-interactions -- It only listens to the field in it. */}
      <div
        onKeyDown={(event) => {
          if (event.key !== 'Enter' || event.ctrlKey || event.metaKey || event.defaultPrevented) return;
          event.preventDefault();
          if (event.target instanceof HTMLInputElement) {
            event.target.blur();
            event.target.focus();
          }
        }}
      >
        <Combobox
          key={chosen.join()}
          label="Parts"
          name={`${name}-part`}
          id={`${name}-part`}
          error={error}
          options={parts
            .filter(({ id }) => !chosen.includes(id))
            .map(({ id, number, name: detail }) => ({ value: id, label: number, detail }))}
          onChange={(id) => {
            if (id === '') return;
            added.current = true;
            onChange([...chosen, id]);
          }}
        />
      </div>
      {chosen.length > 0 && (
        <ul className="flex flex-wrap gap-2">
          {chosen.map((id) => {
            const part = byId.get(id);
            return (
              <li key={id}>
                <button
                  type="button"
                  className="flex min-h-8 items-center gap-1 border border-line bg-sheet pe-2 text-sm hover:border-dye"
                  onClick={() => {
                    onChange(chosen.filter((one) => one !== id));
                  }}
                >
                  <Balloon number={part?.number ?? null} dashed={part?.inPlans === false} />
                  <span>{part?.name ?? 'not in the list any more'}</span>
                  <span className="text-ink-soft" aria-hidden="true">
                    ×
                  </span>
                  <span className="sr-only">, take off the note</span>
                </button>
              </li>
            );
          })}
        </ul>
      )}
    </div>
  );
}
