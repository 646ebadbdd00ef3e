import { z } from 'zod';
import { right, wrong } from '../../domain/answer.ts';
import { inInches, type Length } from '../../domain/lengths/length.ts';
import { parseLengths } from '../../domain/lengths/parse-length.ts';
import {
  SHOP_DENOMINATORS,
  type ShopDenominator,
  toShopFraction,
} from '../../domain/lengths/shop-fraction.ts';
import { readArguments } from '../read-arguments.ts';
import { readRequest } from '../read-request.ts';
import { type Tool } from '../tool.ts';

const USAGE = 'length "1-1/2 in" [--nearest 16|32|64]';

const LengthRequest = z.object({
  text: z.string('Give the size as text, such as "1-1/2 in".'),
  nearest: z.coerce
    .number()
    .pipe(z.literal(SHOP_DENOMINATORS, 'Round to the nearest 16, 32 or 64.'))
    .default(64),
});

function say(length: Length, nearest: ShopDenominator) {
  const { text, errorMm } = toShopFraction(length, nearest);
  return {
    mm: Number(length.mm),
    in: inInches(length).valueOf(),
    fraction: text,
    fractionErrorMm: Number(errorMm),
  };
}

/** A size in both systems, with its nearest shop fraction and the error of that; several sizes under values. */
export const lengthTool: Tool = {
  usage: USAGE,
  fromArguments: (args) => {
    const read = readArguments(args, { nearest: { type: 'string' } }, USAGE);
    if (!read.ok) return read;
    const { options, bare } = read.value;
    return bare.length === 0
      ? wrong(`Give a size. Usage: ${USAGE}`)
      : right({ ...options, text: bare.join(' ') });
  },
  run: (request) => {
    const asked = readRequest(LengthRequest, request);
    if (!asked.ok) return asked;
    const { text, nearest } = asked.value;
    const read = parseLengths(text);
    if (!read.ok) return read;
    const [only, ...more] = read.value.map((length) => say(length, nearest));
    return right(more.length === 0 ? only : { values: [only, ...more] });
  },
};
