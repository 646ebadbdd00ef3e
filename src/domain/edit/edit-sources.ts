/** How an edit came here: an edit list, a timeline, or built by hand. */
export const EDIT_SOURCES = ['list', 'timeline', 'hand'] as const;
export type EditSource = (typeof EDIT_SOURCES)[number];
