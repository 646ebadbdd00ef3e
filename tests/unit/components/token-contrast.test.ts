import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';

const source = readFileSync(new URL('../../../src/styles/tokens.css', import.meta.url), 'utf8');
const [light = '', dark = ''] = source
  .split('@media (prefers-color-scheme: dark)')
  .map((part) => part.split('@media')[0] ?? '');

function readTokens(css: string): Map<string, string> {
  return new Map(
    [...css.matchAll(/(--[\w-]+): (#[0-9a-f]{6});/g)].map(([, name = '', value = '']) => [name, value]),
  );
}

const schemes = {
  light: readTokens(light),
  dark: new Map([...readTokens(light), ...readTokens(dark)]),
};

/** WCAG 2.2 relative luminance and contrast ratio. */
function luminance(hex: string): number {
  const [red = 0, green = 0, blue = 0] = [1, 3, 5].map((at) => {
    const value = Number.parseInt(hex.slice(at, at + 2), 16) / 255;
    return value <= 0.04045 ? value / 12.92 : ((value + 0.055) / 1.055) ** 2.4;
  });
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

function contrast(one: string, other: string): number {
  const [low = 0, high = 0] = [luminance(one), luminance(other)].toSorted((a, b) => a - b);
  return (high + 0.05) / (low + 0.05);
}

const TEXTS = [
  'graphite',
  'graphite-soft',
  'graphite-faint',
  'dye-text',
  'dye-text-deep',
  'brass-dark',
  'primer-text',
  'verdigris-text',
];
const GROUNDS = ['film', 'film-sheet'];
const TEXT_PAIRS = [
  ...TEXTS.flatMap((text) => GROUNDS.map((ground) => [text, ground])),
  ...['dye', 'brass', 'primer', 'verdigris'].flatMap((wash) =>
    ['graphite', 'graphite-soft', 'graphite-faint', 'dye-text'].map((text) => [text, `${wash}-tint`]),
  ),
  ['brass-dark', 'brass-tint'],
  ['primer-text', 'primer-tint'],
  ['verdigris-text', 'verdigris-tint'],
  ...['dye-fill', 'dye-fill-deep', 'dye-fill-lift', 'primer-fill', 'verdigris-fill'].map((fill) => [
    'dye-over',
    fill,
  ]),
  ['dye-over-soft', 'dye-fill-deep'],
  ['brass-over', 'brass-bright'],
  ...['steel-high', 'steel-mid', 'steel-low'].map((steel) => ['steel-mark', steel]),
  ...['pocket-over', 'pocket-over-soft'].flatMap((text) => [
    [text, 'pocket-ground'],
    [text, 'pocket-lift'],
  ]),
] as const;
const CONTROL_PAIRS = [
  ...['film-line-strong', 'dye-text', 'dye-fill', 'primer-text'].flatMap((line) =>
    GROUNDS.map((ground) => [line, ground]),
  ),
  ['pocket-rule', 'pocket-ground'],
] as const;

describe.each(Object.entries(schemes))('colours in the %s', (_scheme, tokens) => {
  const value = (name: string | undefined) => {
    const found = tokens.get(`--${name ?? ''}`);
    if (found === undefined) throw new Error(`no token ${name ?? ''}`);
    return found;
  };

  it.each(TEXT_PAIRS.map(([text, ground]) => ({ text, ground })))(
    '$text can be read on $ground',
    ({ text, ground }) => {
      expect(contrast(value(text), value(ground))).toBeGreaterThanOrEqual(4.5);
    },
  );

  it.each(CONTROL_PAIRS.map(([line, ground]) => ({ line, ground })))(
    '$line can be seen on $ground',
    ({ line, ground }) => {
      expect(contrast(value(line), value(ground))).toBeGreaterThanOrEqual(3);
    },
  );
});
