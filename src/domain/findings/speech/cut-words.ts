import { VULGAR } from '../../lengths/read-number.ts';
import { type Stop } from './speech.ts';

/** A word cut from a caption's text. */
export interface CutWord {
  readonly text: string;
  readonly from: number;
  readonly to: number;
  readonly stop: Stop;
  readonly glued: boolean;
  readonly money: boolean;
}

/** What is no speech: sounds in brackets, music notes. */
const SOUNDS = /\[[^\]]{0,100}\]|\([^)]{0,100}\)|[♪♫]/g;
const CHUNK = /\S+/g;
/** Words that mean nothing and stand in the middle of everything. */
const FILLERS: ReadonlySet<string> = new Set(['um', 'umm', 'uh', 'uhh', 'uhm', 'er', 'erm', 'ah', 'hmm']);

/** A number with what is written close to it, numbers joined by x, a fraction character, a word, or a sign. */
const PIECE =
  /[½¼¾⅛⅜⅝⅞]|\d+\/\d+(?:nds?|rds?|ths?)?(?![a-z])|\d+(?:st|nd|rd|th)s?(?![a-z])|\d{2,}'?s(?![a-z])|m\d+(?=x\d)|\d{1,3}(?:,\d{3})+(?:\.\d+)?|\d+(?:\.\d+)*(?:\/\d+)?|\.\d+|x(?=\d)|\p{L}+\d[\p{L}\d]*|(?:\p{L}\.){2,}|\p{L}[\p{L}\p{M}]*(?:'\p{L}+)*'?|["″°%]/giu;
const SIGNS: Readonly<Record<string, string>> = {
  '"': 'inch',
  '″': 'inch',
  '°': 'degrees',
  '%': 'percent',
  ...VULGAR,
};

/** Cuts a caption's text into words; sounds and fillers are left out, signs are spelled. */
export function cutWords(written: string): CutWord[] {
  const text = written.replace(SOUNDS, (sound) => ' '.repeat(sound.length)).replaceAll('’', "'");
  const words: CutWord[] = [];
  for (const chunk of text.matchAll(CHUNK)) {
    const [whole] = chunk;
    const stop = stopOf(whole);
    const money = /^[$£€]/.test(whole);
    const cut = cutChunk(whole, chunk.index, money);
    const last = cut.pop();
    if (last !== undefined) cut.push({ ...last, stop });
    words.push(...cut);
    const previous = words.at(-1);
    // A dash that stands alone, or the stop after a filler.
    if (cut.length === 0 && stop !== '' && previous !== undefined && previous.stop !== '.')
      words[words.length - 1] = { ...previous, stop };
  }
  return words;
}

function stopOf(chunk: string): Stop {
  if (/[.?!…]["')]*$/.test(chunk) && !/^(?:\p{L}\.){2,}$/u.test(chunk)) return '.';
  return /[,;:–—]["')]*$/.test(chunk) || /^-+$/.test(chunk) ? ',' : '';
}

function cutChunk(chunk: string, at: number, money: boolean): CutWord[] {
  const words: CutWord[] = [];
  for (const piece of chunk.matchAll(PIECE)) {
    const raw = piece[0].toLowerCase();
    const from = at + piece.index;
    const text = spell(raw, words.at(-1)?.text ?? '');
    if (FILLERS.has(text)) continue;
    const glued = words.length > 0 && /[-–/]$/.test(chunk.slice(0, piece.index));
    words.push({ text, from, to: from + raw.length, stop: '', glued, money });
  }
  return words;
}

function spell(raw: string, previous: string): string {
  const sign = SIGNS[raw];
  // A quotation mark is an inch only behind a number.
  if (sign === 'inch') return /\d$/.test(previous) ? sign : '';
  if (sign !== undefined) return sign;
  if (raw === 'x' && /^\d/.test(previous)) return 'by';
  if (/^(?:\p{L}\.){2,}$/u.test(raw)) return raw.replaceAll('.', '');
  if (/^\d+\/\d+/.test(raw)) return raw.replace(/[a-z]+$/, '');
  if (/^\d+'?s$/.test(raw)) return raw.replace(/'?s$/, '');
  return raw.replace(/'$/, '').replace(/(?<=\d),(?=\d)/g, '');
}
