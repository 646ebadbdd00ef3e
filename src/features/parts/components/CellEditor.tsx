import { useEffect, useRef } from 'react';
import { joinClasses } from '../../../components/join-classes.ts';

type CellEditorProps = {
  readonly label: string;
  readonly text: string;
  readonly mono: boolean;
  readonly onType: (text: string) => void;
  /** The focus has gone elsewhere: what was typed is taken. */
  readonly onLeave: () => void;
};

/** The input that stands in a cell while it is typed in. Its keys are the table's. */
export function CellEditor({ label, text, mono, onType, onLeave }: CellEditorProps) {
  const input = useRef<HTMLInputElement>(null);
  useEffect(() => {
    const element = input.current;
    element?.focus();
    element?.setSelectionRange(element.value.length, element.value.length);
  }, []);
  return (
    <input
      ref={input}
      type="text"
      aria-label={label}
      autoComplete="off"
      spellCheck={false}
      value={text}
      onChange={(event) => {
        onType(event.target.value);
      }}
      onBlur={onLeave}
      className={joinClasses('w-full min-w-16 bg-transparent px-2 py-1 outline-none', mono && 'font-mono')}
    />
  );
}
