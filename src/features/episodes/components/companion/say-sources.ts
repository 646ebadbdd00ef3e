import { type CautionSource } from '../../../../domain/cautions/usual-cautions.ts';

/** A source in full: who published it, under what number and title. */
export function sayPublisher({ publisher, number, title }: CautionSource): string {
  return `${publisher}, ${number}, ${title}`;
}

/** Sources by their numbers alone, where the full names stand elsewhere on the page. */
export function sayNumbers(sources: readonly CautionSource[]): string {
  return sources.map(({ number }) => number).join(', ');
}
