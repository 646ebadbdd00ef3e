import { useEffect, useRef } from 'react';
import { joinClasses } from '../../../components/join-classes.ts';

type CellEditorProps = {
  readonly label: string;
  /** What stands in it at first. */
  readonly text: string;
  readonly mono: boolean;
  /** The focus has gone elsewhere: what was typed is taken. */
  readonly onLeave: (text: string) => void;
};

/**
 * The input that stands in a cell while it is typed in. Its keys are the table's; what is typed stays in it until it
 * is taken, so that a long table is not drawn again at every letter.
 */
export function CellEditor({ label, text, mono, onLeave }: CellEditorProps) {
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
      defaultValue={text}
      onBlur={(event) => {
        onLeave(event.target.value);
      }}
      className={joinClasses('w-full min-w-16 bg-transparent px-2 py-1 outline-none', mono && 'font-mono')}
    />
  );
}
