import { useState } from 'react';

const KEY = 'desk-single-keys';

/** Whether keys without Ctrl do anything, as this browser remembers it. */
export function useSingleKeys() {
  const [singles, setSingles] = useState(() => read() !== 'off');
  return {
    singles,
    setSingles: (on: boolean) => {
      setSingles(on);
      try {
        localStorage.setItem(KEY, on ? 'on' : 'off');
      } catch {
        // A browser may refuse to remember; it then holds for this page.
      }
    },
  };
}

function read(): string | null {
  try {
    return localStorage.getItem(KEY);
  } catch {
    return null;
  }
}
