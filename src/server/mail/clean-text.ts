const SUBJECT_LIMIT = 200;

// Marks that turn the direction of writing can make a text read as something else.
const UNPRINTABLE = /[\p{Cc}\p{Surrogate}\u061C\u200E\u200F\u202A-\u202E\u2066-\u2069\uFEFF]/gu;
const BREAKS = /\r\n?|[\n\v\f\u0085\u2028\u2029]/g;

/** Text without control characters; line breaks become `\n` and tabs spaces. */
export function cleanText(text: string): string {
  return text
    .replace(BREAKS, '\n')
    .replace(/\t/g, ' ')
    .split('\n')
    .map((line) => line.replace(UNPRINTABLE, ''))
    .join('\n')
    .trim();
}

/** Text fit for one header line: no breaks or control characters, runs of space as one. */
export function cleanLine(text: string): string {
  return cleanText(text).replace(/\s+/g, ' ');
}

/** A subject: one line of at most 200 characters, never empty. */
export function cleanSubject(subject: string): string {
  const characters = [...cleanLine(subject)];
  if (characters.length === 0) return 'Centrepop';
  if (characters.length <= SUBJECT_LIMIT) return characters.join('');
  return `${characters
    .slice(0, SUBJECT_LIMIT - 1)
    .join('')
    .trimEnd()}…`;
}

/**
 * An address to be clicked, as it is written in a mail.
 * @throws RangeError when it is not a whole http or https address
 */
export function cleanUrl(url: string): string {
  const parsed = URL.canParse(url) ? new URL(url) : undefined;
  if (parsed?.protocol !== 'https:' && parsed?.protocol !== 'http:') {
    throw new RangeError('A link in a mail must be a whole http or https address.');
  }
  return parsed.href;
}
