/** One choice for the desk and the queue of questions. */
const KEY = 'single-keys';

/** Whether keys without Ctrl do anything, as this browser remembers it; they do until somebody says no. */
export function singleKeysAreOn(): boolean {
  try {
    return localStorage.getItem(KEY) !== 'off';
  } catch {
    return true;
  }
}

export function keepSingleKeys(on: boolean): void {
  try {
    localStorage.setItem(KEY, on ? 'on' : 'off');
  } catch {
    // A browser may refuse to remember; it then holds for this page.
  }
}
