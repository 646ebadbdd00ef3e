/** What happened, told once by the verb that did it, in its transaction; the worker fans it out. */
export const EVENTS = [
  'invitation-made',
  'upload-completed',
  'media-found',
  'original-dropped',
  'file-ready',
  // Of a build: clips came or went, or when they ran is known otherwise.
  'footage-changed',
  'announcement-started',
  'question-sent',
  'question-urgent',
  'question-answered',
] as const;
export type EventName = (typeof EVENTS)[number];

/** The ids that an event carries; whoever handles it reads the rows again. */
export type EventIds = Readonly<Record<string, string>>;
