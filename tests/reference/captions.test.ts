import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { captionsTool } from '../../src/cli/tools/captions.ts';
import { readSpokenNumber } from '../../src/domain/findings/numbers/spoken-number.ts';
import { type Label } from '../support/captions/labelled-set.ts';
import { scoreFindings } from '../support/captions/score-findings.ts';
import { referenceFolder } from './support/reference-folder.ts';

const captions = referenceFolder('captions');
const skipped = (folder: string | null) => (folder === null ? ' (skipped: no reference folder here)' : '');
const text = (name: string) => readFileSync(join(captions ?? '', name), 'utf8');

function read(name: string): readonly Label[] {
  const answer = captionsTool.run({ captions: text(`${name}.vtt`), parts: text(`${name}.parts.csv`) });
  if (!answer.ok) throw new Error(answer.error);
  return (answer.value as { findings: readonly Label[] }).findings;
}

describe(`The labelled captions${skipped(captions)}`, () => {
  describe.skipIf(captions === null).each(['press', 'sawbench'])('%s', (name) => {
    it('are read with precision and recall of at least 0.97, and no kind below 0.9', () => {
      const labels = JSON.parse(text(`${name}.labels.json`)) as Label[];
      const found = read(name);
      const all = scoreFindings(labels, found);
      expect(all.precision, JSON.stringify(all.extra)).toBeGreaterThanOrEqual(0.97);
      expect(all.recall, JSON.stringify(all.missed)).toBeGreaterThanOrEqual(0.97);
      for (const kind of new Set(labels.map((label) => label.kind))) {
        const of = (list: readonly Label[]) => list.filter((one) => one.kind === kind);
        expect(scoreFindings(of(labels), of(found)).f1, kind).toBeGreaterThanOrEqual(0.9);
      }
    });
  });
});

const numbers = referenceFolder('numbers');

/**
 * Rows of NeMo's inverse text normalization that are not plain spoken numbers: Indian counting, and values that keep
 * a scale in words, which ours are multiplied by.
 */
const OTHER = /crore|lakh/;
const SCALES: Readonly<Record<string, number>> = {
  thousand: 1e3,
  million: 1e6,
  billion: 1e9,
  trillion: 1e12,
};

function rows(file: string): [spoken: string, written: string][] {
  return readFileSync(join(numbers ?? '', file), 'utf8')
    .split('\n')
    .filter((line) => line.includes('~') && !OTHER.test(line))
    .map((line) => line.trim().split('~') as [string, string]);
}

/** The number at the start of a written form: 1.4 million, .1205, 838.2 mm. */
function valueOf(written: string): number {
  const [, number = '', word = ''] = /^(-?[\d.]+)(?: (\w+))?/.exec(written) ?? [];
  return Number(number) * (SCALES[word] ?? 1);
}

describe(`The spoken numbers of NeMo${skipped(numbers)}`, () => {
  it.skipIf(numbers === null).each(['cardinal.txt', 'decimal.txt', 'measure.txt'])(
    'of %s are read',
    (file) => {
      const wrong = rows(file).filter(([spoken, written]) => {
        const value = written === 'zero' ? 0 : valueOf(written);
        const read = readSpokenNumber(spoken.split(' '), 0)?.value.valueOf();
        return read === undefined || Math.abs(read - value) > Math.abs(value) * 1e-12;
      });
      expect(wrong).toEqual([]);
    },
  );
});
