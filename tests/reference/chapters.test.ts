import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { describe, expect, it } from 'vitest';
import { toJsonChapters } from '../../src/domain/chapters/write-chapters.ts';
import { referenceFolder } from './support/reference-folder.ts';

const folder = referenceFolder('chapters');
const skipped = folder === null ? ' (skipped: no reference folder here)' : '';

interface Sample {
  readonly chapters: readonly { readonly startTime: number; readonly title: string }[];
}

/** Podcastindex-org/podcast-namespace, docs/examples/chapters/example.json. */
describe.skipIf(folder === null)(`The public example of podcast chapters${skipped}`, () => {
  it('is what its own starts and titles are written as', () => {
    const { chapters } = JSON.parse(readFileSync(join(folder ?? '', 'example.json'), 'utf8')) as Sample;
    const written = toJsonChapters(
      chapters.map(({ startTime, title }) => ({ start: startTime * 1000, title })),
    );
    expect(written.chapters.map(({ startTime }) => startTime)).toEqual([
      0, 168, 260, 410, 3990, 4600, 5510, 5854, 6089,
    ]);
    expect(written).toEqual({
      version: '1.2.0',
      chapters: chapters.map(({ startTime, title }) => ({ startTime, title })),
    });
  });
});
