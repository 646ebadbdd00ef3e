import { type CautionSource } from '../../../../domain/cautions/usual-cautions.ts';

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
