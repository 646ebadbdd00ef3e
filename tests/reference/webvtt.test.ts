import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { decodeText } from '../../src/domain/captions/decode-text.ts';
import { readWebvtt } from '../../src/domain/captions/read-webvtt.ts';
import { referenceFolder } from './support/reference-folder.ts';

/**
 * How many captions a player keeps of each file: web-platform-tests, webvtt/parsing/file-parsing, as
 * w3c/webvtt.js carries them.
 */
const COUNTS: Readonly<Record<string, number>> = {
  arrows: 6,
  'header-garbage': 1,
  'header-space': 1,
  'header-tab': 1,
  'header-timings': 1,
  ids: 5,
  newlines: 4,
  nulls: 7,
  'regions-id': 4,
  'regions-lines': 13,
  'regions-old': 2,
  'regions-regionanchor': 20,
  'regions-scroll': 6,
  'regions-viewportanchor': 20,
  'settings-align': 13,
  'settings-line': 46,
  'settings-multiple': 2,
  'settings-position': 22,
  'settings-region': 9,
  'settings-size': 16,
  'settings-vertical': 8,
  'signature-bom': 0,
  'signature-no-newline': 0,
  'signature-space': 0,
  'signature-space-no-newline': 0,
  'signature-tab': 0,
  'signature-tab-no-newline': 0,
  'signature-timings': 0,
  'timings-60': 2,
  'timings-eof': 0,
  'timings-garbage': 0,
  'timings-negative': 4,
  'timings-omitted-hours': 3,
  'timings-too-long': 2,
  'timings-too-short': 2,
  'whitespace-chars': 3,
};

const folder = referenceFolder('webvtt/wpt-file-parsing');

describe(`The public WebVTT files${folder === null ? ' (skipped: no reference folder here)' : ''}`, () => {
  it.skipIf(folder === null).each(Object.entries(COUNTS))('%s.vtt keeps %i captions', (name, count) => {
    const { text } = decodeText(readFileSync(join(folder ?? '', `${name}.vtt`)));
    const read = readWebvtt(text);
    expect(read.ok ? read.value.length : read.error).toBe(count);
  });
});
