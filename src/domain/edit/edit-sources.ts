/** How an edit came here: an edit list, a timeline, built by hand, or by the words of its captions. */
export const EDIT_SOURCES = ['list', 'timeline', 'hand', 'captions'] as const;
export type EditSource = (typeof EDIT_SOURCES)[number];

/** Those that come as a file or as text. */
export type WrittenSource = Exclude<EditSource, 'hand' | 'captions'>;
