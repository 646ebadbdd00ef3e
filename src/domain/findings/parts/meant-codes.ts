import { after, before, type Speech, wordAt } from '../speech/speech.ts';
import { type SpokenCode } from './spoken-codes.ts';

/** Why a number is taken for a part's, and how sure that is; null where it is not. */
export interface Meant {
  readonly rule: string;
  readonly sure: number;
}

const PART =
  /\b(?:parts?|items?|piece|balloon|detail|part numbers?|item numbers?)(?: (?:is|number|num|no|called|it's|that's|of))* $/;
const NUMBER = /\b(?:numbers?|no|num) $/;
/** Part three of the build is an episode. */
const EPISODE_BEFORE =
  /\b(?:(?:see you|back|catch you|was|did|saw|said|made|mentioned|showed|more|watch|watched|remember|left off|started|up) (?:in|for|to|with|at)|next time|last time|welcome to|welcome back to|this is|that was|last|next|in|watch|for|here's|on to|onto|series|video|episode) (?:the )?parts? $/;
const EPISODE_BEHIND =
  /^(?:of|in this|in the series|in my|will be|next week|out|video|comes out|is up|where)\b/;
const FIRST_THING =
  /^(?:reason|reasons|priority|rule|thing|things|fan|cause|suspect|enemy|question|tip|mistake|lesson|job|problem|drill|drills|bit|screw|screws|iron|wood|plates?|of|on my|for me|in my|son|daughter|choice|pick|hit|complaint|comment|goal|safety|son|dad|bus|way|of the)\b/;
const LISTED =
  /^(?:\w+ ){0,2}?(?:on|in|from|off) (?:the|my|our|this) (?:parts? )?(?:list|drawing|drawings|plan|plans|sheet|print|table|cutlist|cut list|bom)\b/;
/** What says that a name or number comes. */
const TELLS =
  /\b(?:that's|this is|that is|it's|which is|they're|these are|those are|here's|called|this one's|this one is|that one's|that'll be|that would be|or|aka|labelled|labeled|marked|stamped|tagged) $/;
const POINTS =
  /\b(?:that's|this is|that is|which is|here's|called|this one's|this one is|labelled|labeled|marked|stamped|tagged) $/;
/** Behind a number that stands for a part. */
const GOES_ON =
  /^(?:$|(?:and|but|so|that|that's|which|it|it's|this|is|goes|gets|was|comes|sits|bolts|fits|needs|has|hasn't|isn't|next|now|here|there|done|again|in|on|at|to|for|with|from|if|because|the|my|i|i'm|i'll|i've|we|we'll|you|just|all|both|already|will|can|can't|won't|should|as|or|by|under|over|between|after|before|when|right|okay|then|not|still|also|only|welds|welded|slides|holds|takes|carries|drops|mounts|hangs|turns|runs|they|they're|these|those|are|were|have|our|up|down|off|out|either|too|today|finally)(?: |$))/;
const NOUNS_BEHIND =
  /^(?:of|more|things|times|in a row|by|at a time|or|minutes|days|thousand|hundred|point|percent)\b/;
const ASKED_TO =
  /\b(?:to|can|can't|could|i|we|you|they|i'll|you'll|we'll|don't|didn't|never|let's|would|should|might|will) $/;

/**
 * Whether a number that is on the list is meant as a part's.
 * @param named whether the part's own name stands close by
 * @param follows whether it continues a row of part numbers: one oh four and one oh five
 */
export function judgeCode(speech: Speech, code: SpokenCode, named: boolean, follows: boolean): Meant | null {
  const b = `${before(speech, code.from, 8)} `;
  const a = after(speech, code.to, 6);
  const part = PART.test(b);
  if (part) {
    const bare = code.letters === 'none' && code.to - code.from <= 2;
    const episode = EPISODE_BEHIND.test(a) || (bare && (EPISODE_BEFORE.test(b) || isGreeting(speech, code)));
    return episode && !named ? null : { rule: 'part and its number', sure: 0.97 };
  }
  if (named) return { rule: 'number beside its name', sure: 0.97 };
  if (LISTED.test(a)) return { rule: 'number on the list', sure: 0.95 };
  if (NUMBER.test(b) && code.letters !== 'article')
    return FIRST_THING.test(a) ? null : { rule: 'number', sure: 0.9 };
  if (follows) return { rule: 'number in a row', sure: 0.85 };
  if (NOUNS_BEHIND.test(a)) return null;
  return code.letters === 'none'
    ? judgeDigits(code, b, a, wordAt(speech, code.from))
    : judgeLetters(code, b, a);
}

function judgeDigits(code: SpokenCode, b: string, a: string, first: string): Meant | null {
  if (!GOES_ON.test(a) || code.digits === 'hundreds' || code.digits === 'sounds') return null;
  const zeros = /^(?:0\d+|double|oh)$/.test(first) && code.to - code.from >= 1 && code.part.length >= 2;
  if (zeros) return { rule: 'number with its zeros', sure: 0.9 };
  if (code.part.length < 3 || code.short) return null;
  if (code.digits === 'read-out' && TELLS.test(b)) return { rule: 'number read out', sure: 0.8 };
  if (code.digits === 'numeral' && POINTS.test(b)) return { rule: 'number told', sure: 0.7 };
  return null;
}

function judgeLetters(code: SpokenCode, b: string, a: string): Meant | null {
  const tells = TELLS.test(b);
  switch (code.letters) {
    case 'written':
      return code.digits === 'sounds'
        ? tells
          ? { rule: 'letter and number', sure: 0.7 }
          : null
        : { rule: 'letter and number', sure: 0.92 };
    case 'named':
      return code.digits === 'sounds' && !tells ? null : { rule: 'letter by its name', sure: 0.88 };
    case 'word':
      if (ASKED_TO.test(b) || !GOES_ON.test(a) || code.digits === 'sounds') return null;
      if (tells) return { rule: 'letter as it sounds', sure: 0.75 };
      return /^(?:is|goes|gets|comes|sits|bolts)\b/.test(a) && !/\b(?:what|how|where|that|if|when) $/.test(b)
        ? { rule: 'letter as it sounds', sure: 0.6 }
        : null;
    default:
      return null;
  }
}

/** Captions at either end in which a maker says which episode it is. */
const GREETING = 3;

/** "It's part four" among the first or last captions is an episode. */
function isGreeting(speech: Speech, code: SpokenCode): boolean {
  const cue = speech.words[code.from]?.cue ?? 0;
  const last = speech.words.at(-1)?.cue ?? 0;
  return last > 4 * GREETING && (cue < GREETING || last - cue < GREETING);
}
