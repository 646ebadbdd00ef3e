/** What happened, told once by the verb that did it, in its transaction; the worker fans it out. */
export const EVENTS = [
  'invitation-made',
  'upload-completed',
  'media-found',
  'original-dropped',
  'file-ready',
  'announcement-started',
] as const;
export type EventName = (typeof EVENTS)[number];

/** The ids that an event carries; whoever handles it reads the rows again. */
export type EventIds = Readonly<Record<string, string>>;
