import { type ListedPart } from '../finding.ts';
import { PUT_RIGHT } from '../speech/put-right.ts';
import { type Speech, phrase } from '../speech/speech.ts';
import { hearNames, type HeardName, stemsOf } from './heard-names.ts';
import { indexNames, type NameIndex } from './listed-names.ts';
import { judgeCode } from './meant-codes.ts';
import { stem } from './stem.ts';
import { type CodeIndex, indexCodes, readCode, type SpokenCode } from './spoken-codes.ts';

/** A part that is spoken of. */
export interface Mention {
  readonly part: string;
  readonly from: number;
  readonly to: number;
  readonly by: 'name' | 'number';
  readonly rule: string;
  readonly sure: number;
}

/** A parts list, made ready to be heard. */
export interface PartIndex {
  readonly names: NameIndex;
  readonly codes: CodeIndex;
}

/** Indexes a parts list once for any length of captions. */
export function indexParts(parts: readonly ListedPart[]): PartIndex {
  return { names: indexNames(parts), codes: indexCodes(parts) };
}

/** Where a part number ends that begins at a word, by a letter that is no other word or beside its name; else null. */
export function letteredCode(speech: Speech, word: number, index: PartIndex): number | null {
  const code = readCode(speech.texts, word, index.codes, (at) => speech.words[at]?.glued === true);
  if (code?.letters === 'none') {
    // "The hinge tubes two oh six": the number of what was just named.
    const own = index.names.wordsOf.get(code.part)?.has(stem(speech.texts[word - 1] ?? '')) === true;
    const readOut = code.digits === 'read-out' || code.digits === 'numeral';
    return own && readOut && code.part.length >= 3 ? code.to : null;
  }
  const lettered =
    code !== null && (code.letters === 'written' || code.letters === 'named') && code.digits !== 'none';
  return lettered && code.digits !== 'sounds' ? code.to : null;
}

/** Words between a part's name and its number in one breath, at most. Our own. */
const BREATH = 7;
/**
 * The parts that are spoken of, by number and by name, in order.
 * @param taken whether a word belongs to a value with its unit
 */
export function findParts(speech: Speech, index: PartIndex, taken: (word: number) => boolean): Mention[] {
  const stems = stemsOf(speech);
  const heard: HeardName[] = [];
  const codes: SpokenCode[] = [];
  const glued = (word: number) => speech.words[word]?.glued === true;
  for (let at = 0; at < speech.words.length; at++) {
    if (taken(at)) continue;
    heard.push(...hearNames(speech, stems, at, index.names));
    const code = readCode(speech.texts, at, index.codes, glued);
    if (code !== null && !crossesTaken(code, taken)) codes.push(code);
  }
  const names = keepLongest(heard.filter((name) => !crossesTaken(name, taken)));
  return joinMentions(
    speech,
    names,
    keepMeant(
      speech,
      codes,
      names,
      (code) => index.names.wordsOf.get(code.part)?.has(stems[code.from - 1] ?? '') === true,
    ),
  );
}

function crossesTaken({ from, to }: { from: number; to: number }, taken: (word: number) => boolean): boolean {
  for (let word = from; word < to; word++) if (taken(word)) return true;
  return false;
}

const MANNERS = { exact: 0, sound: 1, near: 2 } as const;

/** Of names that overlap, the longer stands; of equal ones, the surer. */
function keepLongest(heard: readonly HeardName[]): HeardName[] {
  const order = [...heard].sort(
    (a, b) => b.to - b.from - (a.to - a.from) || MANNERS[a.manner] - MANNERS[b.manner] || a.from - b.from,
  );
  const used = new Set<number>();
  const kept = order.filter(({ from, to }) => {
    for (let word = from; word < to; word++) if (used.has(word)) return false;
    for (let word = from; word < to; word++) used.add(word);
    return true;
  });
  return kept.sort((a, b) => a.from - b.from);
}

function keepMeant(
  speech: Speech,
  codes: readonly SpokenCode[],
  names: readonly HeardName[],
  follows: (code: SpokenCode) => boolean,
): (Mention & { readonly by: 'number' })[] {
  const meant: (Mention & { readonly by: 'number' })[] = [];
  let end = 0;
  let near = 0;
  for (const code of codes) {
    if (code.from < end) continue;
    while ((names[near]?.to ?? Number.POSITIVE_INFINITY) < code.from - BREATH) near++;
    const named = follows(code) || isNamed(names, near, code);
    const other = names
      .slice(near, near + 8)
      .some(({ from, to, name }) => from < code.to && to > code.from && name.part !== code.part);
    if (other) continue;
    const last = meant.at(-1);
    const gap = last === undefined ? null : phrase(speech, last.to, code.from);
    const close = last !== undefined && gap !== null && code.from - last.to <= 5;
    const slip = close && PUT_RIGHT.test(gap);
    const row = close && /^(?:and|or|to|through|then|plus|and then|and a|and also)?$/.test(gap);
    const judged = judgeCode(speech, code, named, slip || (row && code.digits !== 'sounds'));
    if (judged === null) continue;
    if (slip && last.part !== code.part) meant.pop();
    meant.push({ part: code.part, from: code.from, to: code.to, by: 'number', ...judged });
    end = code.to;
  }
  return meant;
}

/** Whether a part's own name stands within a breath of its number. */
function isNamed(names: readonly HeardName[], from: number, code: SpokenCode): boolean {
  // "A two" and "see one" are said of much else.
  const most = code.letters === 'none' && code.digits === 'plain' ? 3 : BREATH;
  for (let place = from; place < names.length; place++) {
    const name = names[place];
    if (name === undefined || name.from > code.to + most) return false;
    const gap = name.from >= code.to ? name.from - code.to : code.from - name.to;
    if (name.name.part === code.part && gap >= 0 && gap <= most) return true;
  }
  return false;
}

const SURE = { exact: 0.9, sound: 0.75, near: 0.65 } as const;
const RULES = { exact: 'name', sound: 'name that sounds so', near: 'name misheard' } as const;

/** A name and its number in one breath are one mention; in one caption a part is mentioned once. */
function joinMentions(speech: Speech, names: readonly HeardName[], codes: readonly Mention[]): Mention[] {
  const named = names.map(({ name, from, to, manner }): Mention => ({
    part: name.part,
    from,
    to,
    by: 'name',
    rule: RULES[manner],
    sure: SURE[manner],
  }));
  const all = [...named, ...codes].sort((a, b) => a.from - b.from || b.to - a.to);
  const kept: Mention[] = [];
  const last = new Map<string, { mention: Mention; cue: number | undefined; place: number }>();
  for (const mention of all) {
    const cue = speech.words[mention.from]?.cue;
    const known = last.get(mention.part);
    const breath =
      known !== undefined && known.mention.by !== mention.by && mention.from - known.mention.to <= BREATH;
    if (known !== undefined && (known.cue === cue || breath)) {
      const before = kept[known.place];
      if (before !== undefined && mention.sure > before.sure)
        kept[known.place] = { ...before, sure: mention.sure };
      last.set(mention.part, { ...known, mention: { ...mention } });
      continue;
    }
    last.set(mention.part, { mention, cue, place: kept.length });
    kept.push(mention);
  }
  return dropSlips(speech, kept);
}

/** "The hopper, no, the spout": only what it was put right to. */
function dropSlips(speech: Speech, mentions: readonly Mention[]): Mention[] {
  return mentions.filter((mention, place) => {
    const next = mentions[place + 1];
    if (
      next === undefined ||
      next.part === mention.part ||
      next.from - mention.to > 4 ||
      next.from < mention.to
    )
      return true;
    return !/^(?:no |sorry |wait |i mean |or rather |scratch that |oops |not |hang on )+(?:sorry |wait |i mean |it's |that's |the |a |i )*$/.test(
      `${phrase(speech, mention.to, next.from)} `,
    );
  });
}
