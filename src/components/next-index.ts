/** Where the arrow, Home and End keys lead in a list that goes round; null for any other key. */
export function nextIndex(
  key: string,
  current: number,
  count: number,
  keys: { readonly back: string; readonly on: string },
): number | null {
  if (count === 0) return null;
  if (key === keys.on) return (current + 1) % count;
  if (key === keys.back) return current <= 0 ? count - 1 : current - 1;
  if (key === 'Home') return 0;
  if (key === 'End') return count - 1;
  return null;
}

/** The next entry, round from the current one, that starts with the letters; -1 when none does. */
export function findByLetters(labels: readonly string[], letters: string, current: number): number {
  const wanted = letters.toLowerCase();
  const order = labels.map((_, step) => (current + (letters.length === 1 ? step + 1 : step)) % labels.length);
  return order.find((index) => labels[index]?.toLowerCase().startsWith(wanted)) ?? -1;
}
