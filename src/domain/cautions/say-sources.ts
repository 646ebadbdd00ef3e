import { type CautionSource } from './usual-cautions.ts';

/** Sources in full: under each publisher its texts, by number and title. */
export function saySources(sources: readonly CautionSource[]): string {
  const publishers = [...new Set(sources.map(({ publisher }) => publisher))];
  return publishers
    .map((publisher) => {
      const texts = sources.filter((source) => source.publisher === publisher);
      return `${publisher}: ${texts.map(({ number, title }) => `${number}, ${title}`).join('; ')}`;
    })
    .join('. ');
}

/** Sources by their numbers alone, where the full names stand elsewhere on the page. */
export function sayNumbers(sources: readonly CautionSource[]): string {
  return sources.map(({ number }) => number).join(', ');
}

/** Sources in one line, each with its publisher and number. */
export function sayPublished(sources: readonly CautionSource[]): string {
  return sources.map(({ publisher, number }) => `${publisher}, ${number}`).join('; ');
}
