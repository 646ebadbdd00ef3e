import { type Cue } from '../../captions/cue.ts';
import { cutWords } from './cut-words.ts';
import { type Speech, type Word } from './speech.ts';
import { unroll } from './unroll.ts';

/** Silence after which a new sentence begins, in seconds. Our own: a breath is shorter. */
const PAUSE = 4;

/**
 * Captions as one stretch of words in the order in which they are spoken, each with its place and its time. Times
 * come from the file where it has them, else a caption's time is shared out by length.
 */
export function readSpeech(cues: readonly Cue[]): Speech {
  const order = cues
    .map((_cue, index) => index)
    .sort((a, b) => (cues[a]?.start ?? 0) - (cues[b]?.start ?? 0) || a - b);
  const words: Word[] = [];
  for (const { cue, text, from } of unroll(cues, order)) {
    const whole = cues[cue];
    if (whole === undefined || from >= text.length) continue;
    const at = clockOf(whole, text.slice(from).startsWith('\n') ? from + 1 : from, text.length);
    const last = words.at(-1);
    if (last !== undefined && whole.start / 1000 - last.end > PAUSE)
      words[words.length - 1] = { ...last, stop: '.' };
    for (const word of cutWords(text.slice(from))) {
      if (word.text === '') continue;
      const place = { from: word.from + from, to: word.to + from };
      words.push({ ...word, ...place, cue, start: at(place.from), end: at(place.to) });
    }
  }
  const texts = words.map(({ text }) => text);
  let length = 0;
  const offsets = words.map(({ text }) => {
    const offset = length;
    length += text.length + 1;
    return offset;
  });
  return { words, texts, text: texts.join(' '), offsets };
}

/** When a character of a caption is spoken, in seconds; what stands before `from` has been spoken already. */
function clockOf(cue: Cue, from: number, length: number): (character: number) => number {
  const knots = [
    { character: from, time: cue.start },
    ...(cue.stamps ?? []).filter(({ character }) => character > from + 1),
    { character: length, time: cue.end },
  ];
  let index = 0;
  return (character) => {
    // Asked in rising order, but for the end of one word and the start of the next.
    while (index > 0 && (knots[index]?.character ?? 0) > character) index--;
    while (index < knots.length - 2 && (knots[index + 1]?.character ?? length) <= character) index++;
    const left = knots[index] ?? { character: from, time: cue.start };
    const right = knots[index + 1] ?? left;
    const share = (character - left.character) / Math.max(1, right.character - left.character);
    return (left.time + (right.time - left.time) * Math.min(1, Math.max(0, share))) / 1000;
  };
}
