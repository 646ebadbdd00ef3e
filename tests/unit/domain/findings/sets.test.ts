import { readdirSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { readFindings } from '../../../../src/domain/findings/read-findings.ts';
import { asLabel } from '../../../support/captions/as-label.ts';
import { readLabelledSet } from '../../../support/captions/labelled-set.ts';
import { scoreFindings } from '../../../support/captions/score-findings.ts';

/**
 * Captions of other trades and voices. Each set was written and labelled before it was first read by the reader, by
 * the rules of the labelled sets that stand beside the project; a label that broke those rules was mended after.
 * Words and labels are ours.
 */
const folder = new URL('./sets/', import.meta.url);
const sets = readdirSync(folder)
  .filter((file) => file.endsWith('.txt'))
  .map((file) => ({ name: file.replace('.txt', ''), set: readLabelledSet(new URL(file, folder)) }));

const read = sets.map(({ name, set }) => ({
  name,
  labels: set.labels,
  found: readFindings(set.cues, set.parts).map(asLabel),
}));

describe('Captions of builds in other trades', () => {
  it.each(read)('are read as a careful person would: $name', ({ labels, found }) => {
    const score = scoreFindings(labels, found);
    expect(score.precision, JSON.stringify(score.extra)).toBeGreaterThanOrEqual(0.95);
    expect(score.recall, JSON.stringify(score.missed)).toBeGreaterThanOrEqual(0.92);
  });

  it.each(['part', 'size'])('give their findings of kind %s with few slips', (kind) => {
    const labels = read.flatMap((set) => set.labels.filter((label) => label.kind === kind)).length;
    const scores = read.map((set) =>
      scoreFindings(
        set.labels.filter((label) => label.kind === kind),
        set.found.filter((finding) => finding.kind === kind),
      ),
    );
    const missed = scores.flatMap((score) => score.missed);
    const extra = scores.flatMap((score) => score.extra);
    expect(extra.length / labels, JSON.stringify(extra)).toBeLessThanOrEqual(0.03);
    expect(missed.length / labels, JSON.stringify(missed)).toBeLessThanOrEqual(0.05);
  });
});
