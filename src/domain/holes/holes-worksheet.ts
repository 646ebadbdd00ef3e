import Fraction from 'fraction.js';
import { type Answer, right, wrong } from '../answer.ts';
import { flagField, lengthField, optional, textField } from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { CLEARANCE, METRIC_COARSE, SPLIT_PINS, type SplitPin, UNIFIED_COARSE } from './hole-tables.ts';

export interface HolesResult {
  /** The thread as it was read. */
  readonly thread: string | null;
  /** Diameter less pitch, mm: what the drill follows from; null for inch threads, which have their charts. */
  readonly tappingExactMm: number | null;
  readonly tappingDrillMm: number | null;
  /** A drill by number, letter or fraction, where the trade has one. */
  readonly tappingDrill: string | null;
  readonly clearanceMm: { readonly fine: number; readonly medium: number; readonly coarse: number } | null;
  readonly splitPin: {
    readonly nominal: number;
    readonly holeMm: number;
    readonly shankMm: readonly [least: number, most: number];
  } | null;
}

const inputs = {
  thread: optional(textField('Thread', 'M8')),
  bolt: optional(lengthField('Bolt, for its split pin', '12')),
  clevis: optional(lengthField('Clevis pin, for its split pin', '16')),
  transverse: flagField('Load that changes direction across the pin'),
};
type Values = ValuesOf<typeof inputs>;

const NOTHING: HolesResult = {
  thread: null,
  tappingExactMm: null,
  tappingDrillMm: null,
  tappingDrill: null,
  clearanceMm: null,
  splitPin: null,
};

function clearanceOf(diameter: number): HolesResult['clearanceMm'] {
  const [fine, medium, coarse] = CLEARANCE[diameter]?.map(Number) ?? [];
  return fine === undefined || medium === undefined || coarse === undefined ? null : { fine, medium, coarse };
}

function metric(diameter: number, pitchText: string | undefined): Answer<HolesResult> {
  const coarse = METRIC_COARSE.find(([size]) => size === diameter);
  if (coarse === undefined)
    return wrong(
      `M${String(diameter)} is not known here. There are M${METRIC_COARSE.map(([size]) => String(size)).join(', M')}.`,
    );
  const [, usual, drill] = coarse;
  const pitch = new Fraction(pitchText ?? usual);
  if (pitch.lt('0.2') || pitch.gt(usual))
    return wrong(`Pitch: M${String(diameter)} has ${usual} mm, or finer from 0.2 mm.`);
  const exact = new Fraction(diameter).sub(pitch).valueOf();
  return right({
    ...NOTHING,
    thread: `M${String(diameter)}x${pitch.toString()}`,
    tappingExactMm: exact,
    tappingDrillMm: pitch.equals(usual) ? Number(drill) : exact,
    clearanceMm: clearanceOf(diameter),
  });
}

function threadOf(text: string): Answer<HolesResult> {
  const [, size, pitch] = /^M(\d{1,2})(?:\s?[x×]\s?(\d(?:\.\d{1,2})?))?$/i.exec(text) ?? [];
  if (size !== undefined) return metric(Number(size), pitch);
  const name = text
    .replace(/\s*UNC$/i, '')
    .replace(/^(\d+-)/, (number) => (/^\d\d?-\d\d$/.test(text) ? `#${number}` : number));
  const unified = Object.hasOwn(UNIFIED_COARSE, name) ? UNIFIED_COARSE[name] : undefined;
  if (unified === undefined)
    return wrong(
      `${text.slice(0, 30)} is no thread that is known here. There are M3 to M30 and ${Object.keys(UNIFIED_COARSE).join(', ')}.`,
    );
  const [drill, inches] = unified;
  return right({
    ...NOTHING,
    thread: name,
    tappingDrillMm: new Fraction(inches).mul('25.4').valueOf(),
    tappingDrill: drill,
  });
}

function pinOf(diameter: Fraction, kind: 'bolts' | 'clevisPins', transverse: boolean): Answer<SplitPin> {
  const at = SPLIT_PINS.findIndex(({ [kind]: [over, upTo] }) => diameter.gt(over) && diameter.lte(upTo));
  const found = at === -1 ? undefined : SPLIT_PINS[at + (transverse && kind === 'clevisPins' ? 1 : 0)];
  const [first, last] = [SPLIT_PINS[0], SPLIT_PINS.at(-1)];
  return found === undefined
    ? wrong(
        `There is no split pin here for ${diameter.toString()} mm: the table has ${String(first?.[kind][0])} to ${String(last?.[kind][1])} mm, with gaps.`,
      )
    : right(found);
}

function find(values: Values): Answer<HolesResult> {
  const { thread, bolt, clevis, transverse } = values;
  if ([thread, bolt, clevis].filter((value) => value !== null).length !== 1)
    return wrong('Give one of a thread, a bolt and a clevis pin.');
  if (thread !== null) return threadOf(thread);
  const pin = pinOf(bolt ?? clevis ?? new Fraction(0), bolt === null ? 'clevisPins' : 'bolts', transverse);
  if (!pin.ok) return pin;
  const { nominal, shank } = pin.value;
  return right({
    ...NOTHING,
    splitPin: {
      nominal: Number(nominal),
      holeMm: Number(nominal),
      shankMm: [Number(shank[0]), Number(shank[1])],
    },
  });
}

function compute(values: Values): Answer<Worked<HolesResult>> {
  const found = find(values);
  if (!found.ok) return found;
  const { thread, tappingExactMm, tappingDrillMm, splitPin } = found.value;
  return right({
    result: found.value,
    working: [
      ...(thread !== null && tappingExactMm !== null
        ? [
            {
              what: 'Tapping hole',
              formula: 'D − P',
              numbers: thread,
              value: `${String(tappingExactMm)} mm; usual drill ${String(tappingDrillMm)} mm`,
            },
          ]
        : []),
      ...(splitPin === null
        ? []
        : [
            {
              what: 'Hole for the split pin',
              formula: 'its nominal size; the shank is thinner',
              numbers: `nominal ${String(splitPin.nominal)} mm`,
              value: `${String(splitPin.holeMm)} mm`,
            },
          ]),
    ],
    sources: [
      { title: 'ISO 273', clause: 'clearance holes', standing: 'published' },
      { title: 'Makers’ charts of tapping drills', clause: 'D − P', standing: 'published' },
      { title: 'ISO 1234', clause: 'table 1', standing: 'memory' },
      { title: 'ISO 2341', clause: 'larger pin under alternating transverse load', standing: 'published' },
    ],
    limits: [
      'Tapping drills for about three quarters of full thread; charts differ by 0.1 mm.',
      'A drill cuts over its size; try it in scrap.',
    ],
    notChecked: ['How deep the thread has to be, and what it holds.'],
    warnings:
      splitPin === null
        ? []
        : [
            'A published list gives larger holes for the same pin (3.4 to 3.8 mm for 3.2). Check ISO 1234 before you drill.',
          ],
    cautions: ['eyes'],
  });
}

/** Holes to be tapped, cleared, or pinned. */
export const holesWorksheet = worksheet({ id: 'holes', title: 'Holes', inputs, compute });
