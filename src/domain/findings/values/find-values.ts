import { type Dialect } from '../finding.ts';
import { readSpokenNumber } from '../numbers/spoken-number.ts';
import { before, phrase, type Speech, wordAt } from '../speech/speech.ts';
import { PUT_RIGHT } from '../speech/put-right.ts';
import { classifyBare, type Worked } from './bare.ts';
import { isGrit } from './grits.ts';
import { type Claim, type Shop } from './claim.ts';
import { classify } from './classify.ts';
import { dropConversions } from './conversions.ts';
import { GRITS, SANDED } from './contexts.ts';
import { type Measure, readMeasure } from './measures.ts';
import { readThread } from './threads.ts';
import { readFiller } from './welding.ts';

/** Numbers of the captions, and what of them is told by a name or a unit of its own. */
export interface Heard {
  readonly measures: readonly Measure[];
  readonly named: readonly Claim[];
  /** Words that belong to a measure with a unit, or to a name. */
  readonly taken: ReadonlySet<number>;
}

const BEGINS =
  /^(?:\d|m\d|p\d|e\d|er\d|\.\d|[½¼¾]|(?:a|an|m|em|g|e|er|p|inch|foot|minus|half|quarter|point|hundred|oh|o|zero|nought|naught|double|one|two|three|four|five|six|seven|eight|nine|ten|eleven|twelve|thirteen|fourteen|fifteen|sixteen|seventeen|eighteen|nineteen|twenty|thirty|forty|fourty|fifty|sixty|seventy|eighty|ninety)$)/;
/** A thread or a filler that a part number could be taken for. */
const THREADED =
  /\b(?:tapped|tap|threaded|an|bolts?|with|for|some|two|four|six|eight|long) (?:an? |some )?\| |\| (?:bolts?|screws?|threads?|taps?|tapped|nuts?|studs?|grit|paper|rods?|stainless|cap|hex|machine|set|countersunk|by|eighths?|quarters?|half|hundred)\b/;
const NUMBERS_PART = /\b(?:parts?|items?|part number|item number) $/;

/**
 * Every number of the captions, with its unit where one is said.
 * @param codeAt where a part number with a letter ends that begins at a word
 */
export function hearValues(speech: Speech, dialect: Dialect, codeAt: (word: number) => number | null): Heard {
  const measures: Measure[] = [];
  const named: Claim[] = [];
  const taken = new Set<number>();
  const take = (from: number, to: number) => {
    for (let word = from; word < to; word++) taken.add(word);
  };
  let at = 0;
  while (at < speech.words.length) {
    const code = codeAt(at);
    if (code !== null && !THREADED.test(`${before(speech, at, 3)} | ${phrase(speech, code, code + 2)} `)) {
      at = code;
      continue;
    }
    const found = BEGINS.test(wordAt(speech, at)) ? hearAt(speech, at, dialect) : null;
    if (found === null) {
      at++;
      continue;
    }
    if ('terms' in found) {
      measures.push(found);
      if (found.dimension !== null) take(found.from, found.to);
    } else {
      named.push(found);
      take(found.from, found.to);
    }
    at = Math.max(found.to, at + 1);
  }
  return { measures, named, taken };
}

function hearAt(speech: Speech, at: number, dialect: Dialect): Measure | Claim | null {
  if (NUMBERS_PART.test(`${before(speech, at, 2)} `)) return null;
  const filler = readFiller(speech.texts, at);
  if (filler !== null)
    return name(at, filler.to, {
      kind: 'setting',
      what: filler.what,
      text: filler.name,
      rule: `${filler.what} by name`,
    });
  const thread = speech.words[at]?.money === true ? null : readThread(speech.texts, at);
  if (thread !== null)
    return name(at, thread.to, {
      kind: 'size',
      values: [{ value: thread.name, unit: 'thread' }],
      rule: 'thread',
    });
  const grit = /^p(\d{2,4})$/.exec(wordAt(speech, at))?.[1];
  if (grit !== undefined && GRITS.has(Number(grit)) && SANDED.test(phrase(speech, at - 15, at + 6)))
    return name(at, at + 1, { kind: 'setting', what: 'grit', text: grit, rule: 'grit by name' });
  const row = SANDED.test(phrase(speech, at - 12, at + 8)) ? gritRow(speech, at) : null;
  if (row !== null) return row;
  const measure = readMeasure(speech.texts, at, dialect);
  if (measure === null) return null;
  if (speech.words[at]?.money === true) return { ...measure, dimension: 'other' };
  return split(speech, measure);
}

function name(from: number, to: number, more: Pick<Claim, 'kind' | 'rule'> & Partial<Claim>): Claim {
  return { from, to, values: [], dimension: 'name', sure: 0.95, ...more };
}

/** Grits that run together: "eighty one twenty one eighty" is three of them, of which this is the first. */
function gritRow(speech: Speech, at: number): Measure | null {
  const whole = readSpokenNumber(speech.texts, at);
  if (whole === null || whole.form === 'numeral' || whole.form === 'fraction' || whole.form === 'decimal')
    return null;
  if (GRITS.has(whole.value.valueOf())) return null;
  for (let length = 1; length < whole.to - at; length++) {
    const first = readSpokenNumber(speech.texts.slice(at, at + length), 0);
    const rest = readSpokenNumber(speech.texts.slice(at + length, at + length + 3), 0);
    if (
      first?.to !== length ||
      !GRITS.has(first.value.valueOf()) ||
      rest === null ||
      !GRITS.has(rest.value.valueOf())
    )
      continue;
    const term = {
      from: at,
      to: at + length,
      value: first.value,
      form: first.form,
      unit: null,
      dimension: null,
      plural: false,
    };
    return { from: at, to: at + length, terms: [term], joined: null, dimension: null };
  }
  return null;
}

/** "Two ten mil bolts" are two bolts of ten: a small count before a plural is no hundreds. */
function split(speech: Speech, measure: Measure): Measure {
  const [first] = measure.terms;
  if (
    first === undefined ||
    measure.terms.length > 1 ||
    first.form !== 'pair' ||
    first.dimension !== 'length' ||
    first.plural
  )
    return measure;
  const count = /^(?:two|three|four|five|six|seven|eight|nine)$/.test(wordAt(speech, measure.from));
  const behind = wordAt(speech, measure.to);
  if (
    !count ||
    !/[^s]s$/.test(behind) ||
    /^(?:is|was|this|has|plus|across|'s)$/.test(behind) ||
    /'s$/.test(behind)
  )
    return measure;
  const number = readSpokenNumber(speech.texts, measure.from + 1);
  if (number === null || number.to > measure.to) return measure;
  const term = { ...first, from: measure.from + 1, value: number.value, form: number.form };
  return { ...measure, from: measure.from + 1, terms: [term] };
}

/** How far back a grit still has others follow it, in words. */
const ROW = 12;

/**
 * What is told of sizes, settings and ratings, in order: each number with the unit that was said or is being worked
 * in, slips put right, the same size in other units left out.
 * @param isPart whether a word belongs to a part
 */
export function findValues(
  speech: Speech,
  heard: Heard,
  shop: Shop,
  isPart: (word: number) => boolean,
): Claim[] {
  const claims: Claim[] = [];
  let worked: Worked = { claim: null, torque: null, pressure: null, rod: Number.NEGATIVE_INFINITY };
  let grit = Number.NEGATIVE_INFINITY;
  const items = [...heard.measures, ...heard.named].sort((a, b) => a.from - b.from);
  for (const item of items) {
    const made = 'terms' in item ? fromMeasure(item) : [item];
    for (const claim of made) {
      const last = claims.at(-1);
      if (last !== undefined && isPutRight(speech, last, claim)) claims.pop();
      claims.push(last === undefined ? claim : beside(speech, last, claim));
      if (claim.what === 'grit') grit = claim.to;
      const unit = claim.values[0]?.unit ?? null;
      worked = {
        claim: claim.dimension === 'name' || claim.what === 'grit' ? worked.claim : claim,
        torque: claim.dimension === 'torque' ? unit : worked.torque,
        pressure: claim.dimension === 'pressure' ? unit : worked.pressure,
        rod: claim.what === 'electrode' || claim.what === 'wire' ? claim.to : worked.rod,
      };
    }
  }
  return dropConversions(speech, claims);

  function fromMeasure(measure: Measure): Claim[] {
    if (measure.dimension === 'grit' || isGrit(speech, measure, measure.from - grit <= ROW))
      return gritClaims(measure);
    if (measure.dimension === 'other') return [];
    if (measure.dimension !== null) {
      const claim = classify(speech, measure, shop);
      const plate = claims.at(-1);
      // "The twenty-four volt ones, three hundred kilo": more of a nameplate.
      if (claim !== null || measure.dimension !== 'mass' || plate?.kind !== 'rating') return present(claim);
      if (measure.from - plate.to > 3 || measure.terms.at(-1)?.plural === true) return [];
      const values = measure.terms.map(({ value, unit }) => ({ value, unit: unit ?? '' }));
      return [
        {
          from: measure.from,
          to: measure.to,
          kind: 'rating',
          values,
          dimension: 'mass',
          rule: 'more of a nameplate',
          sure: 0.6,
        },
      ];
    }
    if (isPart(measure.from) || isPart(measure.to - 1)) return [];
    const last = claims.at(-1);
    const bare = classifyBare(speech, measure, shop, worked, isPart);
    if (bare !== null) return [bare];
    // "Eighty mil, sorry, eighteen".
    const gap = last === undefined || measure.from - last.to > 4 ? '' : phrase(speech, last.to, measure.from);
    if (last === undefined || last.dimension === 'name' || gap === '' || !PUT_RIGHT.test(gap)) return [];
    const unit = last.values[0]?.unit ?? '';
    return [
      {
        ...last,
        from: measure.from,
        to: measure.to,
        values: measure.terms.map(({ value }) => ({ value, unit })),
      },
    ];
  }
}

function gritClaims(measure: Measure): Claim[] {
  return measure.terms.map((term) =>
    name(term.from, term.to, {
      kind: 'setting',
      what: 'grit',
      text: String(term.value.valueOf()),
      rule: 'grit',
    }),
  );
}

function present(claim: Claim | null): Claim[] {
  return claim === null ? [] : [claim];
}

/** What the value right before makes of one: more of a nameplate, the diameter of a rod. */
function beside(speech: Speech, last: Claim, claim: Claim): Claim {
  const gap = phrase(speech, last.to, claim.from);
  const plate =
    claim.what === 'speed' ||
    claim.what === 'current' ||
    claim.what === 'voltage' ||
    claim.what === 'pressure';
  if (
    last.kind === 'rating' &&
    plate &&
    claim.from - last.to <= 4 &&
    !/\b(?:set|at|to|on|so|i|i'm|but|turn\w*)\b/.test(gap)
  ) {
    const { what: _what, ...rest } = claim;
    return { ...rest, kind: 'rating', rule: 'more of a nameplate' };
  }
  if (
    last.what === 'electrode' &&
    last.text !== undefined &&
    claim.dimension === 'length' &&
    /^(?:in|the|of|at|in the|in a|a)?$/.test(gap)
  )
    return { ...claim, kind: 'setting', what: 'electrode', rule: 'electrode diameter' };
  return claim;
}

function isPutRight(speech: Speech, last: Claim, next: Claim): boolean {
  if (
    next.from - last.to > 9 ||
    last.dimension !== next.dimension ||
    (last.dimension === 'name' && last.what !== next.what)
  )
    return false;
  const gap = `${phrase(speech, last.to, next.from)} `;
  return PUT_RIGHT.test(gap) || /^(?:actually|well actually|or actually|rather|not) $/.test(gap);
}
