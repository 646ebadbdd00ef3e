import { findSizes, type SizeFound } from '../lengths/find-sizes.ts';

/** A stretch of a note's text, to be shown in its own way. Joined, the texts are the note again. */
export type NotePiece =
  | { readonly kind: 'text'; readonly text: string }
  | { readonly kind: 'size'; readonly text: string; readonly size: SizeFound }
  | { readonly kind: 'part'; readonly text: string; readonly partId: string };

/** A part of the build, by the number that people write. */
export interface NumberedPart {
  readonly id: string;
  readonly number: string;
}

export interface NotePiecesOptions {
  /** The build's parts: their numbers are names, never sizes. */
  readonly parts?: readonly NumberedPart[];
  /** The note's own parts: their bare numbers are references too, where no unit follows. */
  readonly ownPartIds?: readonly string[];
}

interface Reference {
  readonly start: number;
  readonly end: number;
  readonly partId: string;
}

/** What comes before a number that makes it a part's: part 118, parts 101 and 104. */
const NAMED_BEFORE = /\bparts?[ \u00a0](?:[\p{L}\p{N}-]{1,24}(?:,[ ]|[ ](?:and|or|to)[ ]|–))*$/iu;

/** A unit or count behind a number: then it is an amount, such as 115 A. */
const AMOUNT_AFTER =
  /^(?:[ \u00a0-]?(?:A|V|W|kW|hp|rpm|bar|psi|MPa|Nm|N|kN|kg|lb|t|L|s|min|h|C|F)\b|[ ]?[°%]|[ ]needed\b|[.,]\d|[:/]\d)/;

/** A note's text in pieces: words, sizes, and references to parts. */
export function notePieces(
  text: string,
  { parts = [], ownPartIds = [] }: NotePiecesOptions = {},
): NotePiece[] {
  const sizes = findSizes(text, { names: parts.map((part) => part.number) });
  const found: (SizeFound | Reference)[] = [...sizes];
  for (const reference of findReferences(text, parts, ownPartIds))
    if (sizes.every(({ start, end }) => reference.end <= start || end <= reference.start))
      found.push(reference);
  const pieces: NotePiece[] = [];
  let at = 0;
  for (const one of found.sort((a, b) => a.start - b.start)) {
    if (one.start > at) pieces.push({ kind: 'text', text: text.slice(at, one.start) });
    const own = text.slice(one.start, one.end);
    pieces.push(
      'partId' in one
        ? { kind: 'part', text: own, partId: one.partId }
        : { kind: 'size', text: own, size: one },
    );
    at = one.end;
  }
  if (at < text.length) pieces.push({ kind: 'text', text: text.slice(at) });
  return pieces;
}

function findReferences(
  text: string,
  parts: readonly NumberedPart[],
  ownPartIds: readonly string[],
): Reference[] {
  const byNumber = new Map(parts.map((part) => [part.number.toLowerCase(), part.id]));
  return [...text.matchAll(/(?<![\p{L}\p{N}.#-])[\p{L}\p{N}](?:[\p{L}\p{N}.-]*[\p{L}\p{N}])?/gu)].flatMap(
    ({ index, 0: word }) => {
      const partId = byNumber.get(word.toLowerCase());
      if (partId === undefined) return [];
      const end = index + word.length;
      const named = NAMED_BEFORE.test(text.slice(0, index));
      // K03 can only be a part; 118 may be anything, so it needs the word before it or the note’s own list.
      const lettered = /\p{L}/u.test(word) && /\p{N}/u.test(word);
      const own = ownPartIds.includes(partId) && !AMOUNT_AFTER.test(text.slice(end));
      return named || lettered || own ? { start: index, end, partId } : [];
    },
  );
}
