import { right, type Answer } from '../answer.ts';
import { formatNumber } from '../quantities/format-number.ts';
import { choiceField, lengthTextField, withDefault } from '../worksheets/fields.ts';
import { type ValuesOf, type Worked, worksheet } from '../worksheets/worksheet.ts';
import { formatInches, formatMillimetres } from './format-length.ts';
import { inInches } from './length.ts';
import { SHOP_DENOMINATORS, type ShopDenominator, toShopFraction } from './shop-fraction.ts';

export interface LengthsResult {
  readonly mm: number;
  readonly in: number;
  readonly fraction: string;
  /** The mark less the length, mm. */
  readonly fractionErrorMm: number;
}

const inputs = {
  text: lengthTextField('Length', '1-1/2 in'),
  nearest: withDefault(choiceField('The rule has', ['64ths', '32nds', '16ths']), '64ths', '64ths'),
};
type Values = ValuesOf<typeof inputs>;

function compute({ text: length, nearest }: Values): Answer<Worked<LengthsResult>> {
  const denominator = SHOP_DENOMINATORS.find((one) => nearest.startsWith(String(one))) as ShopDenominator;
  const { text, errorMm } = toShopFraction(length, denominator);
  const off = Number(errorMm);
  return right({
    result: { mm: Number(length.mm), in: inInches(length).valueOf(), fraction: text, fractionErrorMm: off },
    working: [
      {
        what: 'In millimetres',
        formula: '1 in = 25.4 mm',
        numbers: length.typed,
        value: formatMillimetres(length),
      },
      {
        what: 'In inches',
        formula: '1 in = 25.4 mm',
        numbers: length.typed,
        value: formatInches({ ...length, decimals: length.decimals ?? 3 }),
      },
      {
        what: `Nearest mark of the rule, ${nearest}`,
        formula: 'halves go up',
        numbers: length.typed,
        value: `${text} in, ${off === 0 ? 'exactly' : `${formatNumber(Math.abs(off), 3)} mm ${off > 0 ? 'long' : 'short'}`}`,
      },
    ],
    sources: [
      {
        title: 'International yard and pound agreement of 1959',
        clause: '1 in = 25.4 mm exactly',
        standing: 'published',
      },
    ],
    limits: ['Lengths above zero and up to a kilometre.'],
    notChecked: ['Whether the length is a name of the trade: a 2 by 4, a 3/8 pipe, an M12 are no lengths.'],
    warnings: [],
    cautions: [],
  });
}

/** A length in both systems, and on an inch rule. */
export const lengthsWorksheet = worksheet({ id: 'lengths', title: 'Lengths', inputs, compute });
