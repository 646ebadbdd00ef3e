import { useEffect, useRef } from 'react';
import { type Command, commandOf } from './desk-keys.ts';

/** Whether keys belong to what has the focus: a field that is typed in, a list, a dialog. */
function isTyping(target: EventTarget | null): boolean {
  if (!(target instanceof Element)) return false;
  if (target.closest('dialog, [role=menu]') !== null) return true;
  if (target instanceof HTMLInputElement)
    return !['checkbox', 'radio', 'button', 'submit'].includes(target.type);
  return target.matches('textarea, select, [contenteditable], iframe');
}

/** Space and Enter press what has the focus; the desk must not take them from it. */
function isPress(event: KeyboardEvent): boolean {
  return (
    (event.key === ' ' || event.key === 'Enter') &&
    event.target instanceof Element &&
    event.target.matches('button, a, summary, input')
  );
}

/** Arrows go from one choice to the next. */
function isChoosing({ key, target }: KeyboardEvent): boolean {
  return key.startsWith('Arrow') && target instanceof Element && target.matches('[type=radio]');
}

/** Listens to the keys of the whole page. @param singles false when keys without Ctrl are switched off */
export function useDeskKeys(singles: boolean, run: (command: Command) => void): void {
  const latest = useRef(run);
  useEffect(() => {
    latest.current = run;
  });
  useEffect(() => {
    const press = (event: KeyboardEvent) => {
      if (event.defaultPrevented || event.isComposing || isPress(event)) return;
      if (isChoosing(event)) return;
      if (isTyping(event.target)) {
        const inDialog = event.target instanceof Element && event.target.closest('dialog') !== null;
        if (event.key === 'Escape' && !inDialog && event.target instanceof HTMLElement) event.target.blur();
        return;
      }
      const command = commandOf(event, singles);
      if (command === null) return;
      event.preventDefault();
      latest.current(command);
    };
    document.addEventListener('keydown', press);
    return () => {
      document.removeEventListener('keydown', press);
    };
  }, [singles]);
}
