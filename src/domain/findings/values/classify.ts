import type Fraction from 'fraction.js';
import { after, before, type Speech } from '../speech/speech.ts';
import { type Claim, type ClaimedValue, type Shop } from './claim.ts';
import * as context from './contexts.ts';
import { type Measure, type Term } from './measures.ts';
import { fractionWritten } from './threads.ts';

/** Diameters in millimetres in which covered electrodes are sold: ISO 544. */
const ELECTRODE_MM = [1.6, 2, 2.5, 2.6, 3.2, 4, 5, 6];
const ELECTRODE_IN = [1 / 16, 5 / 64, 3 / 32, 1 / 8, 5 / 32, 3 / 16, 1 / 4];
const ELECTRODE_BEHIND =
  /^(?:(?:welding|stick|low hydrogen|of|the|these|those) )*(?:rods|electrodes?|sticks|e?60(?:10|11|12|13)|e?70(?:14|16|18|24)|(?:60|sixty|70|seventy) (?:1\d|2\d|ten|eleven|twelve|thirteen|fourteen|sixteen|eighteen|twenty))/;
const WIRE_BEHIND =
  /^(?:(?:solid|mig|flux|core|cored|welding|filler|tig|steel|stainless|of) )*(?:wire|wires|filler|filler rods?|flux core)\b/;

/** A measure with its unit as a finding; null where it is nothing that is noted. */
export function classify(speech: Speech, measure: Measure, shop: Shop): Claim | null {
  const b = `${before(speech, measure.from, 10)} `;
  const a = after(speech, measure.to, 10);
  const claim = (kind: Claim['kind'], rule: string, more: Partial<Claim> = {}): Claim => ({
    from: measure.from,
    to: measure.to,
    kind,
    values: valuesOf(speech, measure),
    dimension: measure.dimension ?? 'length',
    rule,
    sure: 0.9,
    ...more,
  });
  if (/^or (?:two|three|so of)\b/.test(a) || /\b(?:couple|few|bunch|million|number of)(?: of| a)? $/.test(b))
    return null;
  switch (measure.dimension) {
    case 'length':
      return classifyLength(speech, measure, b, a, claim);
    case 'angle':
      return classifyAngle(measure, b, a, shop, claim);
    case 'gauge':
      return /\bnumber $/.test(b) ? null : claim('size', 'gauge');
    case 'current':
      if (/^(?:nozzle|tip|tips|consumables)\b/.test(a)) return null;
      return context.SUPPLY.test(`${lastWords(b, 2)} ${firstWords(a, 2)}`) ||
        (/\b(?:draws?|pulls|rated|supply)\b/.test(b) && !context.WELDING.test(b))
        ? claim('rating', 'supply current')
        : claim('setting', 'current', { what: 'current' });
    case 'voltage':
      return classifyVoltage(measure, b, a, claim);
    case 'turning':
      return /^(?:electric |ac |dc |three phase |single phase )?(?:motor|engine)\b/.test(a) ||
        /\b(?:motor|engine)(?:'s| is|'s a| is a) $/.test(b)
        ? claim('rating', 'rated speed', { sure: 0.7 })
        : claim('setting', 'speed', { what: 'speed' });
    case 'cutting':
      return claim('setting', 'cutting speed', { what: /\b(?:wire|feed)\b/.test(b + a) ? 'feed' : 'speed' });
    case 'feed':
      return claim('setting', 'feed', { what: 'feed' });
    case 'torque':
      return /\b(?:motor|rated) $/.test(b) || /^(?:motor|servo|stepper)/.test(a)
        ? claim('rating', 'rated torque', { sure: 0.6 })
        : claim('setting', 'torque', { what: 'torque' });
    case 'heat':
      return classifyHeat(b, a, claim);
    case 'time':
      return classifyTime(b, a, claim);
    case 'power':
      return claim('rating', 'power');
    case 'pressure':
      return context.RATED.test(lastWords(b, 5)) ||
        /\bsafety valve\b/.test(lastWords(b, 5)) ||
        !context.SET.test(`${b}${firstWords(a, 5)}`)
        ? claim('rating', 'rated pressure')
        : claim('setting', 'pressure', { what: 'pressure' });
    case 'flow':
      return /\b(?:gas|argon|co2|shielding|regulator|flow meter|mix|bottle)\b/.test(b + a)
        ? null
        : claim('rating', 'flow');
    case 'force':
      return measure.terms.some(({ unit }) => unit === 't') && isWeight(b, a)
        ? null
        : claim('rating', 'force');
    case 'mass':
      return (isRated(b, a) || isLifter(measure, b)) && !isWeight(b, a)
        ? claim('rating', 'rated mass')
        : null;
    case 'volume':
      return classifyVolume(measure, b, a, claim);
    default:
      return null;
  }
}

type Make = (kind: Claim['kind'], rule: string, more?: Partial<Claim>) => Claim;

function classifyLength(speech: Speech, measure: Measure, b: string, a: string, claim: Make): Claim | null {
  const [first] = measure.terms;
  if (first === undefined) return null;
  const single = measure.terms.length === 1;
  if (
    single &&
    isSold(first) &&
    (ELECTRODE_BEHIND.test(a) || (/^(?:welding )?rod\b/.test(a) && context.WELDING.test(lastWords(b, 6))))
  )
    return claim('setting', 'electrode diameter', { what: 'electrode' });
  if (
    single &&
    WIRE_BEHIND.test(a) &&
    millimetres(first) <= 2.5 &&
    !/\b(?:gauge|fence|fencing|spring)\b/.test(b)
  )
    return claim('setting', 'wire diameter', { what: 'wire' });
  if (first.unit === 'm' && /^(?:a|per) (?:minute|second|min)/.test(a)) return null;
  if (context.TOOL_BEHIND.test(a)) return null;
  if (
    context.OUTSIDE_BEHIND.test(a) ||
    (context.OUTSIDE_BEFORE.test(b) && !/^(?:long|wide|deep|thick|across|diameter)\b/.test(a))
  )
    return null;
  if (first.form === 'article' && !context.WAY_BEHIND.test(a) && !context.STOCK_BEHIND.test(a)) return null;
  // Six foot two is somebody's height unless something is measured.
  if (
    isHeight(speech, measure) &&
    !/^(?:long|wide|deep|thick|across)\b/.test(a) &&
    /\b(?:he|she|who|tall|lad|kid|brother|sister|guy|bloke|fella|man)\b/.test(`${b}${a}`)
  )
    return null;
  if (/\bfeed\b/.test(lastWords(b, 4))) return claim('setting', 'feed', { what: 'feed', sure: 0.7 });
  return claim('size', measure.joined === 'by' ? 'section' : 'size');
}

function classifyAngle(measure: Measure, b: string, a: string, shop: Shop, claim: Make): Claim | null {
  const rated =
    context.RATED.test(lastWords(b, 4)) && measure.terms.every(({ value }) => value.compare(60) > 0);
  const hot =
    rated ||
    (context.HEATED.test(`${lastWords(b, 8)} ${firstWords(a, 4)}`) &&
      measure.terms.every(({ value }) => value.compare(45) > 0));
  if (hot && !/\b(?:angle|bend|bent|fold\w*|miter|mitre|bevel\w*|cut|chamfer\w*|tilt\w*)\b/.test(b)) {
    const values = measure.terms.map(({ value }) => ({ value, unit: shop.units === 'in' ? 'F' : 'C' }));
    if (context.RATED.test(lastWords(b, 4)))
      return claim('rating', 'rated temperature', { values, dimension: 'heat' });
    return claim('setting', 'temperature', { what: 'temperature', values, dimension: 'heat' });
  }
  if (/^(?:outside|today|in here|in the shed|in the shop|in the shade|out there|here)\b/.test(a)) return null;
  if (
    /\b(?:turn|turned|rotate|rotated|flip|flipped|spin|spun|round|around|a full) (?:it |that |them )?(?:through |by )?$/.test(
      b,
    )
  )
    return null;
  return claim('size', 'angle');
}

function classifyVoltage(measure: Measure, b: string, a: string, claim: Make): Claim | null {
  const [first] = measure.terms;
  const low = first !== undefined && first.value.compare(48) <= 0;
  const welds = context.WELDING.test(`${b}${a}`) || /\b(?:set|on|turned|dialed|dialled|voltage)\b/.test(b);
  const named = first?.plural === false && a !== '' && !context.FREE_BEHIND.test(a);
  if (
    low &&
    welds &&
    !named &&
    !context.SUPPLY.test(`${lastWords(b, 3)} ${firstWords(a, 2)}`.replace(/\bwire\b/g, ''))
  )
    return claim('setting', 'voltage', { what: 'voltage' });
  return claim('rating', 'supply voltage');
}

function classifyHeat(b: string, a: string, claim: Make): Claim | null {
  if (/^(?:outside|today|in here|in the shed|in the shop)\b/.test(a)) return null;
  return context.RATED.test(lastWords(b, 4))
    ? claim('rating', 'rated temperature')
    : claim('setting', 'temperature', { what: 'temperature' });
}

function classifyTime(b: string, a: string, claim: Make): Claim | null {
  if (!context.CURED.test(`${lastWords(b, 9)} ${firstWords(a, 9)}`)) return null;
  if (context.SPENT.test(b) && !/^(?:in the|between|per inch|an inch)\b/.test(a)) return null;
  return context.SPENT_BEHIND.test(a) ? null : claim('setting', 'time', { what: 'time' });
}

function classifyVolume(measure: Measure, b: string, a: string, claim: Make): Claim | null {
  const named =
    /^(?:(?:hydraulic|oil|air|fuel|steel|plastic|per|a|an) )*(?:tank|reservoir|compressor|bottle|pump|cylinder|motor|engine|receiver|bucket|drum|pot|hopper|capacity|rev|revolution|turn)\b/.test(
      a,
    );
  const holds =
    /\b(?:holds?|capacity|takes|rated|tank(?:'s| is)|reservoir(?:'s| is))(?: (?:about|of|is|a|at))* $/.test(
      b,
    );
  const [first] = measure.terms;
  return holds || (named && first?.plural === false) || (named && first?.unit === 'cc')
    ? claim('rating', 'volume', { sure: 0.7 })
    : null;
}

function isRated(b: string, a: string): boolean {
  return (
    context.RATED.test(lastWords(b, 6)) ||
    context.LIFTING_BEHIND.test(a) ||
    /^(?:of (?:pull|lift|force|thrust|clamping))/.test(a)
  );
}

/** "The slides are hundred pound": a lifting thing's own figure, as part of its name. */
function isLifter(measure: Measure, b: string): boolean {
  const named = measure.terms.at(-1)?.plural === false;
  return (
    named &&
    /\b(?:slides?|runners?|hoist|winch|jack|slings?|shackles?|chain|castors?|casters?|struts?|magnets?|straps?|axles?)\b/.test(
      lastWords(b, 9),
    )
  );
}

function isWeight(b: string, a: string): boolean {
  return context.WEIGHED.test(`${lastWords(b, 5)} ${firstWords(a, 3)}`) && !/\brated\b/.test(b);
}

function isHeight(speech: Speech, measure: Measure): boolean {
  return speech.texts.slice(measure.from, measure.to).some((word) => word === 'foot' || word === 'feet');
}

function isSold(term: Term): boolean {
  const sold = term.unit === 'in' ? ELECTRODE_IN : ELECTRODE_MM;
  return (
    (term.unit === 'in' || term.unit === 'mm') &&
    sold.some((size) => Math.abs(size - term.value.valueOf()) < 0.01)
  );
}

function millimetres(term: Term): number {
  const factor = { in: 25.4, thou: 0.0254, mm: 1 }[term.unit ?? ''] ?? 1000;
  return term.value.valueOf() * factor;
}

/** The values of a measure; a unit that was said once holds for those before it. */
export function valuesOf(speech: Speech, measure: Measure, bare = ''): ClaimedValue[] {
  let unit = bare;
  const units = [...measure.terms].reverse().map((term) => (unit = term.unit ?? unit));
  // A unit said only with the first holds for what follows.
  const first = measure.terms.find((term) => term.unit !== null)?.unit ?? bare;
  return measure.terms.map((term, index) => {
    const own = units[units.length - 1 - index] ?? '';
    return { value: asWritten(speech, term), unit: own === '' ? first : own };
  });
}

/** 5.16 inch is what recognisers make of 5/16 inch. */
function asWritten(speech: Speech, term: Term): Fraction {
  if (term.unit !== 'in' || term.plural) return term.value;
  return fractionWritten(speech.texts[term.from] ?? '') ?? term.value;
}

export function lastWords(text: string, count: number): string {
  return text.trim().split(' ').slice(-count).join(' ');
}

export function firstWords(text: string, count: number): string {
  return text.split(' ').slice(0, count).join(' ');
}
