import { type Dialect } from '../finding.ts';

/** What a unit measures. */
export type Dimension =
  | 'length'
  | 'angle'
  | 'gauge'
  | 'current'
  | 'voltage'
  | 'turning'
  | 'cutting'
  | 'feed'
  | 'torque'
  | 'heat'
  | 'time'
  | 'power'
  | 'pressure'
  | 'flow'
  | 'force'
  | 'mass'
  | 'volume'
  | 'grit'
  | 'other';

/** A unit as found behind a number. */
export interface SpokenUnit {
  /** As in the list of units of the labels; empty for what is counted but never noted. */
  readonly unit: string;
  readonly dimension: Dimension;
  /** The first word behind it. */
  readonly to: number;
  /** Said in the plural: amps, where a name would have "amp". */
  readonly plural: boolean;
}

/** Singular forms, plural forms; a form of several words has spaces. */
const FORMS: readonly (readonly [unit: string, dimension: Dimension, one: string, many: string])[] = [
  [
    'mm',
    'length',
    'mm|ml|mill|millimeter|millimetre|milli meter|milli metre',
    'mils|mills|mms|millimeters|millimetres|milli meters|milli metres',
  ],
  [
    'cm',
    'length',
    'cm|centimeter|centimetre|centi meter|centi metre',
    'centimeters|centimetres|cms|centi meters|centi metres',
  ],
  ['m', 'length', 'meter|metre', 'meters|metres'],
  ['um', 'length', 'micron|um|micrometre', 'microns|micrometers|micrometres'],
  ['in', 'length', 'inch', 'inches'],
  ['ft', 'length', 'foot|ft', 'feet'],
  [
    'thou',
    'length',
    'thou|thousandth|thousandth of an inch',
    'thous|thousandths|thousandths of an inch|thousands of an inch',
  ],
  ['deg', 'angle', 'degree|deg', 'degrees|degs'],
  ['ga', 'gauge', 'gauge|gage|ga', 'gauges'],
  ['A', 'current', 'amp|ampere|a', 'amps|amperes'],
  ['V', 'voltage', 'volt|v', 'volts'],
  [
    'rpm',
    'turning',
    '',
    'rpm|rpms|r p m|revs|revs a minute|revs per minute|revs a min|revolutions per minute|revolutions a minute|turns a minute|turns per minute',
  ],
  [
    'm/min',
    'cutting',
    '',
    'meters a minute|metres a minute|meters per minute|metres per minute|meter a minute|metre a minute|m per minute',
  ],
  [
    'mm/rev',
    'feed',
    '',
    'mil a rev|mil per rev|mils a rev|mils per rev|mill a rev|mill per rev|ml a rev|mm a rev|mm per rev|mm per revolution|millimeters per rev|millimetres per rev|millimeters a rev|millimetres a rev|millimeter per rev|millimetre per rev|millimeter a rev|millimetre a rev|mil a revolution|mil per revolution|mil a turn|mil per turn|millimeters per revolution|millimetres per revolution',
  ],
  ['Nm', 'torque', '', 'nm|n m|newton meter|newton meters|newton metre|newton metres|newtons meters'],
  [
    'ft-lb',
    'torque',
    '',
    'foot pound|foot pounds|foot lbs|ft lb|ft lbs|ft pounds|pound feet|pounds feet|pound foot|pounds of torque|foot pounds of torque',
  ],
  [
    'C',
    'heat',
    '',
    'c|degree c|degrees c|degree celsius|degrees celsius|celsius|degrees centigrade|centigrade|deg c',
  ],
  ['F', 'heat', '', 'f|degree f|degrees f|degree fahrenheit|degrees fahrenheit|fahrenheit|deg f'],
  ['s', 'time', 'second|sec', 'seconds|secs'],
  ['min', 'time', 'minute|min', 'minutes|mins'],
  ['h', 'time', 'hour|hr', 'hours|hrs'],
  ['W', 'power', 'watt|w', 'watts'],
  ['kW', 'power', 'kilowatt|kw|k w|kilo watt', 'kilowatts|kws|kilo watts'],
  ['hp', 'power', 'horse|horsepower|horse power|hp|h p', 'horses|hps'],
  ['bar', 'pressure', 'bar', 'bars|bar pressure'],
  ['psi', 'pressure', 'psi|p s i', 'psis|pounds per square inch|pounds a square inch'],
  ['MPa', 'pressure', 'mpa|megapascal|mega pascal|m p a', 'megapascals|mega pascals'],
  [
    'L/min',
    'flow',
    '',
    'lpm|l p m|liters a minute|litres a minute|liters per minute|litres per minute|liter a minute|litre a minute|liter per minute|litre per minute',
  ],
  ['gpm', 'flow', '', 'gpm|g p m|gallons a minute|gallons per minute|gallon a minute|gallon per minute'],
  ['N', 'force', 'newton', 'newtons'],
  ['kN', 'force', 'kn|kilonewton|kilo newton|k n', 'kilonewtons|kilo newtons'],
  ['t', 'force', 'ton|tonne', 'tons|tonnes'],
  ['lb', 'mass', 'pound|lb', 'pounds|lbs'],
  ['kg', 'mass', 'kilo|kg|kilogram|kilogramme|k g', 'kilos|kgs|kilograms|kilogrammes'],
  ['L', 'volume', 'liter|litre', 'liters|litres'],
  ['gal', 'volume', 'gallon|gal', 'gallons'],
  ['cc', 'volume', 'cc|c c|cubic centimeter|cubic centimetre', 'ccs|cubic centimeters|cubic centimetres'],
  ['grit', 'grit', 'grit', 'grits'],
  // Numbers of these are never noted; they keep a number from being taken for a bare one.
  [
    '',
    'other',
    "tpi|t p i|threads per inch|percent|dollar|buck|quid|euro|cent|penny|day|week|month|year|mile|oz|ounce|gram|times|time|bit|way|people|person|pm|am|oclock|o'clock|bob|pence|cycle|hertz|hz|khz|meg|megs|gig|square foot|square meter|square metre",
    'dollars|bucks|euros|cents|pennies|days|weeks|months|years|miles|ounces|grams|bits|ways|square feet|square meters|square metres|mph|miles an hour|cycles',
  ],
];

interface Form {
  readonly words: readonly string[];
  readonly unit: string;
  readonly dimension: Dimension;
  readonly plural: boolean;
}

/** Forms by their first word, the longest first. */
const BY_FIRST: ReadonlyMap<string, readonly Form[]> = (() => {
  const map = new Map<string, Form[]>();
  for (const [unit, dimension, one, many] of FORMS)
    for (const [list, plural] of [
      [one, false],
      [many, true],
    ] as const)
      for (const form of list.split('|').filter((text) => text !== '')) {
        const words = form.split(' ');
        const first = words[0] ?? '';
        map.set(first, [...(map.get(first) ?? []), { words, unit, dimension, plural }]);
      }
  for (const forms of map.values()) forms.sort((a, b) => b.words.length - a.words.length);
  return map;
})();

/** Units of one letter are units only behind numerals: "240 v", not "two forty v". "a" and "m" never are. */
const LETTERS: ReadonlySet<string> = new Set(['a', 'v', 'w', 'c', 'f']);

/** Behind one of these a lone c or f is a scale of heat, unless it is the shape of a clamp or begins a number. */
const TENS = /^(?:twenty|thirty|forty|fifty|sixty|seventy|eighty|ninety|hundred|.*teen|\d{2,})$/;
const CLAMPS = /^(?:clamps?|sections?|channels?|\d.*|one|two|three|four|five|six|seven|eight|nine|ten)$/;

/** The unit that begins at a word, the longest that fits. */
export function readUnit(words: readonly string[], at: number, dialect: Dialect): SpokenUnit | null {
  const first = words[at] ?? '';
  if (first === 'mil' && !(BY_FIRST.get('mil') ?? []).some((form) => fits(form, words, at)))
    return mil(at, dialect);
  for (const form of BY_FIRST.get(first) ?? []) {
    if (!fits(form, words, at)) continue;
    if (form.words.length === 1 && LETTERS.has(first)) {
      const numeral = /^[\d.]+$/.test(words[at - 1] ?? '');
      const heat =
        /^[cf]$/.test(first) && TENS.test(words[at - 1] ?? '') && !CLAMPS.test(words[at + 1] ?? '');
      if (first === 'a' || !(numeral || heat)) continue;
    }
    if (first === 'mils' && dialect.mil === 'thou') return { ...mil(at, dialect), plural: true };
    return { unit: form.unit, dimension: form.dimension, to: at + form.words.length, plural: form.plural };
  }
  return null;
}

function mil(at: number, dialect: Dialect): SpokenUnit {
  return { unit: dialect.mil === 'thou' ? 'thou' : 'mm', dimension: 'length', to: at + 1, plural: false };
}

function fits(form: Form, words: readonly string[], at: number): boolean {
  return form.words.every((word, index) => words[at + index] === word);
}
