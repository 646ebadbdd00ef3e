/** How soon something that waits for a person wants doing. */
export const URGENCIES = ['now', 'soon', 'whenever'] as const;
export type Urgency = (typeof URGENCIES)[number];

/** Something that waits for the person who looks, as Today lists it. */
export interface Waiting {
  readonly urgency: Urgency;
  /** A sentence: what waits. */
  readonly what: string;
  /** Where it is done. */
  readonly href: string;
  readonly due: Date | null;
}

/** What waits, most urgent first; among equals what is due sooner, and what is due at all, before the rest. */
export function sortWaiting(waiting: readonly Waiting[]): Waiting[] {
  const due = (item: Waiting) => item.due?.getTime() ?? Number.POSITIVE_INFINITY;
  return [...waiting].sort(
    (a, b) => URGENCIES.indexOf(a.urgency) - URGENCIES.indexOf(b.urgency) || due(a) - due(b) || 0,
  );
}
