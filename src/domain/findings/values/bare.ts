import type Fraction from 'fraction.js';
import { type SettingName } from '../finding.ts';
import { after, before, type Speech } from '../speech/speech.ts';
import { type Claim, type Shop } from './claim.ts';
import { firstWords, lastWords, valuesOf } from './classify.ts';
import { FREE_BEHIND, STOCK_BEHIND, TOOL_BEHIND, WAY_BEHIND, WELDING } from './contexts.ts';
import {
  NEAR,
  SPEED,
  FEED,
  CURRENT,
  VOLTS,
  TORQUE,
  PRESSURE,
  HEAT,
  NUMBER_WORD,
  ROD_MM,
  TURNED,
  SIZED,
  READ,
  PLANNED,
  DIAMETER,
  DEGREES,
  ANGLED,
  NOMINAL,
  COUNTED_TURNS,
} from './bare-contexts.ts';
import { type Measure } from './measures.ts';
import { fractionWritten } from './threads.ts';

/** What was last measured or set, for numbers that follow without a unit. */
export interface Worked {
  readonly claim: Claim | null;
  readonly torque: string | null;
  readonly pressure: string | null;
  /** Where an electrode or a wire was last told of. */
  readonly rod: number;
}

/** A number without a unit as a finding, where what stands beside it says what it is. */
export function classifyBare(
  speech: Speech,
  measure: Measure,
  shop: Shop,
  worked: Worked,
  isPart: (word: number) => boolean,
): Claim | null {
  const [first] = measure.terms;
  if (first === undefined) return null;
  const b = `${before(speech, measure.from, 10)} `;
  const a = after(speech, measure.to, 8);
  const value = first.value.valueOf();
  const next = speech.words[measure.to];
  // In a new caption a number begins something new.
  const free =
    FREE_BEHIND.test(a) ||
    (next !== undefined && next.cue !== speech.words[measure.to - 1]?.cue && NUMBER_WORD.test(next.text));
  const claim = (rule: string, unit: string, more: Partial<Claim> = {}): Claim => ({
    from: measure.from,
    to: measure.to,
    kind: 'size',
    values: valuesOf(speech, measure, unit),
    dimension: 'length',
    rule,
    sure: 0.7,
    ...more,
  });
  const set = (what: SettingName, unit: string, dimension: Claim['dimension']): Claim =>
    claim(`bare ${what}`, unit, { kind: 'setting', what, dimension });

  if (measure.joined === 'by') return bySection(speech, measure, b, a, shop, claim);
  const wire = /^(?:(?:solid|mig|tig|flux|core|cored|welding) )*(?:wire|flux core|filler)\b/.test(a)
    ? wireSize(first.value, speech.texts[first.from] ?? '')
    : null;
  if (wire !== null) return { ...set('wire', wire.unit, 'length'), values: [wire] };
  if (
    ROD_MM.includes(value) &&
    /^(?:welding )?(?:rods?|electrodes?|sticks?)\b/.test(a) &&
    (WELDING.test(b) || /^(?:welding )?(?:rods|electrodes)\b/.test(a))
  )
    return set('electrode', 'mm', 'length');
  if (first.form === 'fraction' || first.form === 'mixed') return inchFraction(measure, b, a, shop, claim);
  const split = fractionWritten(speech.texts[first.from] ?? '');
  if (
    split !== null &&
    split.d >= 16n &&
    (shop.units === 'in' || WAY_BEHIND.test(a)) &&
    (free || WAY_BEHIND.test(a) || STOCK_BEHIND.test(a))
  )
    return { ...claim('written fraction', 'in'), values: [{ value: split, unit: 'in' }] };
  if (isForty(measure, b, a)) return claim('bare angle', 'deg', { dimension: 'angle' });
  const earlier = worked.claim;
  const ends = free || next === undefined || next.cue !== speech.words[measure.to - 1]?.cue;
  if (
    earlier !== null &&
    earlier.kind !== 'rating' &&
    ends &&
    measure.from - earlier.to <= 3 &&
    /\b(?:and then|then|and then a|every) $/.test(b)
  )
    return followed(earlier, claim);
  if (first.form === 'decimal' && STOCK_BEHIND.test(a)) return claim('stock by its thickness', shop.units);
  if (
    /^(?:on|in) (?:the|my) (?:drawing|plan|plans|print|sheet)s?\b/.test(a) &&
    /\b(?:says|said|shows|it's|is|was|were) (?:about )?$/.test(b)
  )
    return claim('figure of the plan', unitNear(measure, shop, worked, true));
  if (
    shop.units === 'mm' &&
    value >= 3 &&
    SINGLE_STOCK.test(a) &&
    (/^(?:round|square|flat)\b/.test(a) ||
      /\b(?:a|the|solid|some|of|is|it's|in|from|off|old|this|that|that's|just|by) $/.test(b))
  )
    return claim('stock by its size', 'mm');
  if (
    shop.units === 'mm' &&
    value >= 3 &&
    SINGLE_STOCK.test(a) &&
    (/^(?:round|square|flat)\b/.test(a) ||
      /\b(?:a|the|solid|some|of|is|it's|in|from|off|old|this|that|that's|just|by) $/.test(b))
  )
    return claim('stock by its size', 'mm');
  // "The flow pipe's twenty two", where sizes are called in millimetres.
  const said = /'s$/.test(speech.texts[measure.from - 1] ?? '') && isPart(measure.from - 1);
  const is = /^(?:is|are)$/.test(speech.texts[measure.from - 1] ?? '') && isPart(measure.from - 2);
  if ((said || is) && ends && shop.units === 'mm' && (first.form === 'decimal' || value >= 5))
    return claim('a part is so much', 'mm', { sure: 0.55 });
  if (!free && !WAY_BEHIND.test(a)) return null;
  if (FEED.test(b) && value < 5) return set('feed', 'mm/rev', 'feed');
  if (SPEED.test(b) && value >= 50) return set('speed', 'rpm', 'turning');
  if (TORQUE.test(b)) return set('torque', worked.torque ?? (shop.units === 'in' ? 'ft-lb' : 'Nm'), 'torque');
  if (CURRENT.test(b) && value >= 20 && value <= 400 && !/\bmachined?\b.*\bto $/.test(b))
    return set('current', 'A', 'current');
  if (
    measure.from - worked.rod <= 4 &&
    value >= 20 &&
    value <= 400 &&
    /\b(?:at|on|at about|on about|around|with) $/.test(b)
  )
    return set('current', 'A', 'current');
  if (VOLTS.test(b) && value < 60) return set('voltage', 'V', 'voltage');
  if (PRESSURE.test(b) && value >= 2)
    return set('pressure', worked.pressure ?? (shop.units === 'in' ? 'psi' : 'bar'), 'pressure');
  const hot =
    /\b(?:harden\w*|quench\w*|temper\w*|anneal\w*|critical|forging|orange|cherry|normali[sz]\w*)\b/.test(
      `${b}${firstWords(a, 5)}`,
    ) && /\b(?:to|at|around|about) $/.test(b);
  if ((HEAT.test(b) && value >= 60) || (hot && value >= 150))
    return set('temperature', scaleOf(value, `${b}${firstWords(a, 5)}`, shop), 'heat');
  const last = worked.claim;
  const sized =
    last !== null &&
    last.dimension === 'length' &&
    !/^(?:m|ft)$/.test(last.values[0]?.unit ?? '') &&
    measure.from - last.to <= 12;
  if (last !== null && measure.from - last.to < NEAR && TURNED.test(b)) return followed(last, claim);

  if (
    last?.what === 'speed' &&
    measure.from - last.to <= 10 &&
    value >= 100 &&
    /\b(?:and|then|or|but) $/.test(b)
  )
    return followed(last, claim);

  return isSize(b, a, measure, sized)
    ? claim('bare size', unitNear(measure, shop, worked, PLANNED.test(b)))
    : null;
}

/** Steel is tempered at no less than 330 degrees Fahrenheit, at which it is 165 Celsius: ASM Heat Treater's Guide. */
const TEMPERED_F = 330;

/** The scale of a bare temperature: the shop's, but where it makes no sense. */
function scaleOf(value: number, around: string, shop: Shop): string {
  if (/\btemper\w*/.test(around) && value <= TEMPERED_F) return 'C';
  return shop.units === 'in' ? 'F' : 'C';
}

/** "Down to sixty": of the kind and the unit of what was told before. */
function followed(
  last: Claim,
  claim: (rule: string, unit: string, more?: Partial<Claim>) => Claim,
): Claim | null {
  const unit = last.values[0]?.unit;
  if (unit === undefined || unit === 'thread' || last.kind === 'rating' || last.text !== undefined)
    return null;
  const { kind, dimension } = last;
  return claim('same unit as before', unit, {
    kind,
    dimension,
    ...(last.what === undefined ? {} : { what: last.what }),
  });
}

/** Bar, plate and section that is called by one number. */
const SINGLE_STOCK =
  /^(?:round|square|plate|bar|flat|box|angle|channel|tube|rod|ply|pipe|sheet|shs|rhs|hex|solid)(?= |$)/;
/** How near, in words, a length stands whose unit a bare one shares. */
const SHARED = 25;

/** The unit that a bare length is in: that of a length close before, else the shop's. Thou are told as thou, but for a plan's figure. */
function unitNear(measure: Measure, shop: Shop, worked: Worked, planned: boolean): string {
  const last = worked.claim;
  const unit = last?.values[0]?.unit;
  if (last === null || unit === undefined || last.dimension !== 'length' || measure.from - last.to > SHARED)
    return shop.units;
  return unit === 'thread' || (unit === 'thou' && !planned) ? shop.units : unit;
}

function isSize(b: string, a: string, measure: Measure, sized: boolean): boolean {
  const [first] = measure.terms;
  if (first === undefined) return false;
  if (TOOL_BEHIND.test(a)) return false;
  // "Where the plan shows four" may be how many.
  const counted = PLANNED.test(b) && first.form !== 'decimal' && first.value.compare(10) < 0 && !sized;
  if ((PLANNED.test(b) && !counted) || READ.test(b) || DIAMETER.test(b)) return true;
  // A year, or a count of something.
  if (first.form === 'pair' && /\b(?:in|since|from|of|year) $/.test(b)) return false;
  if (SIZED.test(b)) return true;
  return (
    first.value.compare(3) > 0 &&
    WAY_BEHIND.test(a) &&
    /^(?:long|longer|shorter|wider|thicker|taller|deeper|higher|lower|oversize|undersize|above|below|wide|tall|high|deep|thick|across|apart|diameter|dia|square|centers|centres|on cent|wall|bore|overall|in diameter|radius|outside diameter|inside diameter)\b/.test(
      a,
    )
  );
}

function bySection(
  speech: Speech,
  measure: Measure,
  b: string,
  a: string,
  shop: Shop,
  claim: (rule: string, unit: string, more?: Partial<Claim>) => Claim,
): Claim | null {
  const values = measure.terms.map(({ value }) => value.valueOf());
  const key = values.join('x');
  if (
    /^(?:1x1|24x7|9x5)$/.test(key) ||
    TOOL_BEHIND.test(a) ||
    /\b(?:one by one|two by two)\b/.test(speech.texts.slice(measure.from, measure.to).join(' '))
  )
    return null;
  if (NOMINAL.has(key) && !/\b(?:mil|mm)\b/.test(`${lastWords(b, 4)} ${firstWords(a, 3)}`))
    return claim('nominal timber', 'in', { sure: 0.85 });
  if (measure.terms.some(({ form }) => form === 'fraction' || form === 'mixed'))
    return claim('section in inches', 'in');
  // Nothing of a shop that thinks in inches is forty inches thick.
  const metric =
    shop.units === 'mm' ||
    (values.filter((value) => value >= 20).length === values.length && values.length > 2);
  return claim('section', metric ? 'mm' : 'in', { sure: 0.8 });
}

function inchFraction(
  measure: Measure,
  b: string,
  a: string,
  shop: Shop,
  claim: (rule: string, unit: string, more?: Partial<Claim>) => Claim,
): Claim | null {
  const [first] = measure.terms;
  if (first === undefined || TOOL_BEHIND.test(a) || COUNTED_TURNS.test(a)) return null;
  const divisor = Number(first.value.d);
  const fine = divisor >= 8 && (divisor & (divisor - 1)) === 0;
  const stock = STOCK_BEHIND.test(a) || WAY_BEHIND.test(a);
  const made = SIZED.test(b) || READ.test(b) || PLANNED.test(b) || DIAMETER.test(b) || TURNED.test(b);
  if (divisor > 64 || (divisor & (divisor - 1)) !== 0) return null;
  if (fine) return claim('fraction', 'in', { sure: 0.85 });
  if (/^(?:and|of|on the|to go|past|so|i|on|or)\b/.test(a) && !made) return null;
  if (first.form === 'mixed') {
    if (!(stock || made)) return null;
    return claim('mixed number', shop.units === 'in' || stock ? 'in' : 'mm');
  }
  return stock || (made && FREE_BEHIND.test(a)) ? claim('fraction', 'in', { sure: 0.8 }) : null;
}

/** "A forty five on the end", "at 45". */
function isForty(measure: Measure, b: string, a: string): boolean {
  const [first] = measure.terms;
  if (first === undefined || measure.terms.length > 1 || !DEGREES.has(first.value.valueOf())) return false;
  if (!FREE_BEHIND.test(a) && !/^(?:angle|miter|mitre|cut|bevel|chamfer|corner|on|each|both|either)/.test(a))
    return false;
  const forty = first.value.equals(45);
  if (first.value.equals(90) && !/\b(?:bend|bent|fold|folded)\b/.test(lastWords(b, 6))) return false;
  if (forty && /\b(?:a|the|at a|those|two|some|with) $/.test(b) && !/\b(?:drill|gauge|calibre) $/.test(b))
    return true;
  return (
    /\b(?:at|to|at a|to a|at about|up to|over to) $/.test(b) &&
    ANGLED.test(lastWords(b, 8)) &&
    (forty || /\b(?:miter|mitre|bevel|tilt|angle|fold|bend|bent|folded|lean|slope|chamfer)/.test(b))
  );
}

/** Sizes of solid wire as it is sold: millimetres, and thousandths of an inch that are spelled out. */
function wireSize(value: Fraction, word: string): { value: Fraction; unit: string } | null {
  const number = value.valueOf();
  const thousandths = [23, 24, 25, 30, 35, 45, 52, 62];
  if (thousandths.includes(number) && (/^(?:0|oh?$|zero)/.test(word) || word.startsWith('0')))
    return { value: value.div(1000), unit: 'in' };
  if (thousandths.includes(Math.round(number * 1000))) return { value, unit: 'in' };
  return number >= 0.5 && number <= 2.4 ? { value, unit: 'mm' } : null;
}
