import { phrase, type Speech, wordAt } from '../speech/speech.ts';
import { EVERYDAY, TIES } from './common-words.ts';
import { type ListedName, type NameIndex } from './listed-names.ts';
import { isOutside } from './outside.ts';
import { likeness, phonetic, soundDistance, soundsLike } from './sound-alike.ts';
import { stem } from './stem.ts';

/** A name, or what was made of one. */
export interface HeardName {
  readonly name: ListedName;
  readonly from: number;
  readonly to: number;
  readonly manner: 'exact' | 'sound' | 'near';
}

/** Below this likeness of letters two words that sound alike are not taken for one. Our own. */
const ALIKE = 0.55;
/** A single word is matched harder, for there is nothing beside it to bear it out. */
const ALIKE_ALONE = 0.6;
/** One that sounds the same in all its consonants. */
const ALIKE_SOUND = 0.5;

/** A noun is said to come. */
const DETERMINED =
  /(?:^| )(?:the|this|that|these|those|my|our|a|an|each|both|every|two|three|four|other)(?: |$)/;

/** Stems of all words, computed once. */
export function stemsOf(speech: Speech): string[] {
  const known = new Map<string, string>();
  return speech.texts.map((word) => {
    const stemmed = known.get(word) ?? stem(word);
    known.set(word, stemmed);
    return stemmed;
  });
}

/** The names that begin at a word, in any manner; longer and surer ones first. */
export function hearNames(
  speech: Speech,
  stems: readonly string[],
  at: number,
  index: NameIndex,
): HeardName[] {
  const heard: HeardName[] = [];
  let key = '';
  for (let length = 1; length <= index.longest && at + length <= stems.length; length++) {
    if (length > 1 && speech.words[at + length - 2]?.stop === '.') break;
    key += stems[at + length - 1] ?? '';
    const name = index.byKey.get(key);
    if (name === undefined) continue;
    if (!isOutside(speech, name, at, at + length))
      heard.push({ name, from: at, to: at + length, manner: 'exact' });
  }
  if (heard.length === 0 && !TIES.has(wordAt(speech, at)))
    heard.push(...hearSounds(speech, stems, at, index));
  heard.push(...hearNear(speech, stems, at, index));
  return heard;
}

/** The whole name sounds alike, however it is cut: port a daptor, dust shoot. */
function hearSounds(speech: Speech, stems: readonly string[], at: number, index: NameIndex): HeardName[] {
  const heard: HeardName[] = [];
  let key = '';
  for (let length = 1; length <= index.longest && at + length <= stems.length; length++) {
    if (length > 1 && speech.words[at + length - 2]?.stop !== '') break;
    key += stems[at + length - 1] ?? '';
    if (key.length < 4) continue;
    if (key.length > 40) break;
    if (length === 1 && (EVERYDAY.has(key) || EVERYDAY.has(wordAt(speech, at)))) continue;
    if (length > 1 && TIES.has(wordAt(speech, at + length - 1))) continue;
    const sound = phonetic(key);
    for (const name of index.bySound.get(sound) ?? []) {
      const single = name.stems.length === 1;
      if (single && !DETERMINED.test(phrase(speech, at - 2, at))) continue;
      if (likeness(key, name.key) < (single ? ALIKE_SOUND : ALIKE) || (single && length > 2)) continue;
      if (!isOutside(speech, name, at, at + length))
        heard.push({ name, from: at, to: at + length, manner: 'sound' });
    }
  }
  const word = stems[at] ?? '';
  if (heard.length > 0 || word.length < 5 || EVERYDAY.has(word) || EVERYDAY.has(wordAt(speech, at)))
    return heard;
  const sound = phonetic(word);
  for (const name of index.single.get(sound.slice(0, 1)) ?? []) {
    if (Math.min(sound.length, name.sound.length) < 4 || soundDistance(sound, name.sound) > 1) continue;
    if (likeness(word, name.key) < ALIKE_ALONE || !DETERMINED.test(phrase(speech, at - 2, at))) continue;
    if (!isOutside(speech, name, at, at + 1)) heard.push({ name, from: at, to: at + 1, manner: 'near' });
  }
  return heard;
}

/** A name of several words of which all but one are heard as they are: bearing how's in, drip train. */
function hearNear(speech: Speech, stems: readonly string[], at: number, index: NameIndex): HeardName[] {
  const heard: HeardName[] = [];
  const look = (names: readonly ListedName[] | undefined, try_: (name: ListedName) => HeardName | null) => {
    for (const name of names ?? []) {
      const found = try_(name);
      if (found !== null && !isOutside(speech, name, found.from, found.to)) heard.push(found);
    }
  };
  // The first word is right and the rest is not quite.
  look(index.byWord.get(stems[at] ?? ''), (name) => {
    if (name.stems[0] !== stems[at] || speech.words[at]?.stop !== '') return null;
    const rest = name.stems.slice(1).join('');
    const to = nearestEnd(speech, stems, at + 1, rest, name.stems.length - 1);
    return to === null ? null : { name, from: at, to, manner: 'near' };
  });
  // The last word is right and the first is not quite.
  look(index.byWord.get(stems[at + 1] ?? ''), (name) => {
    if (name.stems.length !== 2 || name.stems[1] !== stems[at + 1] || speech.words[at]?.stop !== '')
      return null;
    return isNear(speech, stems[at] ?? '', at, name.stems[0] ?? '')
      ? { name, from: at, to: at + 2, manner: 'near' }
      : null;
  });
  return heard;
}

/** Where words end that are nearly the wanted ones: one word, or two that one was cut into. */
function nearestEnd(
  speech: Speech,
  stems: readonly string[],
  from: number,
  wanted: string,
  count: number,
): number | null {
  const first = stems[from] ?? '';
  if (count === 1 && isNear(speech, first, from, wanted)) return from + 1;
  if (wanted.length < 5 || speech.words[from]?.stop !== '') return null;
  const joined = speech.texts
    .slice(from, from + count + 1)
    .join('')
    .replaceAll("'", '');
  if (count === 1 && TIES.has(wordAt(speech, from))) return null;
  const [one, other] = [phonetic(joined), phonetic(wanted)];
  if (
    one.slice(0, 1) !== other.slice(0, 1) ||
    soundDistance(one, other) > 1 ||
    likeness(joined, wanted) < ALIKE
  )
    return null;
  return from + count + 1;
}

function isNear(speech: Speech, word: string, at: number, wanted: string): boolean {
  if (word === wanted || word.length < 3 || TIES.has(wordAt(speech, at)) || TIES.has(word)) return false;
  const alike = likeness(word, wanted);
  if (alike < ALIKE) return false;
  const [one, other] = [phonetic(word), phonetic(wanted)];
  if (one === other || soundsLike(word, wanted)) return true;
  if (one.slice(0, 1) !== other.slice(0, 1) && alike < 0.8) return false;
  return (
    soundDistance(one, other) <= 1 && alike >= ALIKE_ALONE - 0.001 && Math.max(one.length, other.length) >= 3
  );
}
