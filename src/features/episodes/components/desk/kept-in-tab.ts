/** What this tab keeps under a name over a reload; null for nothing. A browser may refuse to keep anything. */
export function readKept<Value>(name: string): Value | null {
  try {
    const text = sessionStorage.getItem(name);
    return text === null ? null : (JSON.parse(text) as Value);
  } catch {
    return null;
  }
}

/** Keeps a value for this tab, or forgets it. */
export function writeKept(name: string, value: unknown): void {
  try {
    if (value === null) sessionStorage.removeItem(name);
    else sessionStorage.setItem(name, JSON.stringify(value));
  } catch {
    // Then it is kept only as long as the page.
  }
}
