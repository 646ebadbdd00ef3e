/** What is said of a PDF by the status that its rewriting ended with. */
export const PDF_REFUSALS = {
  2: 'The PDF is damaged or was cut off. Export it again and send that.',
  3: 'The PDF is locked with a password. Save it without one and send that.',
} as const;
