import { basename, dirname } from 'node:path';
import { describe, expect, it } from 'vitest';
import { findCycles } from './support/architecture/cycles.ts';
import {
  type Edge,
  filesBelow,
  readImportGraph,
  readSource,
  sayEdge,
} from './support/architecture/import-graph.ts';
import { placeOf, refusalOf } from './support/architecture/layers.ts';
import { generateOnCopy, journalTimes } from './support/architecture/migrations.ts';
import { isThere, pathsNamedIn } from './support/architecture/named-paths.ts';

const OURS = ['src', 'fake-s3', 'fake-smtp', 'scripts', 'tests'];
const { files, edges } = readImportGraph(OURS);
const source = files.filter((file) => file.startsWith('src/'));

function refusals(chosen: readonly Edge[]): string[] {
  return chosen.flatMap((edge) => {
    const reason = refusalOf(edge);
    return reason === null ? [] : [`${sayEdge(edge)}: ${reason}`];
  });
}

describe('What may import what', () => {
  it('sees the imports of every kind of source', () => {
    const from = (ending: string) =>
      edges.filter((edge) => edge.ours && edge.from.startsWith('src/') && edge.from.endsWith(ending)).length;
    expect(Math.min(from('.ts'), from('.tsx'), from('.astro'))).toBeGreaterThan(20);
  });

  it('has every source in a folder of the layout', () => {
    for (const file of source) expect(() => placeOf(file)).not.toThrow();
  });

  it.each([
    ['src/domain/mail.ts', 'src/server/env.ts'],
    ['src/components/Button.tsx', 'src/domain/mail.ts'],
    ['src/layouts/PageShell.astro', 'src/features/workshops/server/list-team.ts'],
    ['src/server/verb.ts', 'src/features/workshops/workshop.ts'],
    ['src/features/workshops/workshop.ts', 'src/db/client.ts'],
    ['src/features/accounts/server/sign-in.ts', 'src/features/workshops/workshop.ts'],
    ['src/features/orders/server/list-orders.ts', 'src/features/diary/diary.ts'],
    ['src/features/builds/server/list-builds.ts', 'src/features/workshops/emails.ts'],
    ['src/pages/index.astro', 'tests/support/throwaway.ts'],
    ['src/worker.ts', 'fake-smtp/start.ts'],
    ['fake-s3/main.ts', 'src/server/env.ts'],
  ])('refuses that %s imports %s', (from, to) => {
    expect(refusalOf({ from, to, line: 1, typeOnly: true, ours: true })).not.toBeNull();
  });

  it('is kept between the layers and the features', () => {
    expect(refusals(edges.filter((edge) => edge.ours))).toEqual([]);
  });

  it('finds every file that is imported', () => {
    const known = new Set(files);
    const asset = /(\.(json|svg|txt|d\.ts)|\?raw)$/;
    // Written by the build, beside the bundles.
    const built = 'src/server/entry.mjs';
    const lost = edges.filter(({ ours, to }) => ours && !known.has(to) && !asset.test(to) && to !== built);
    expect(lost.map(sayEdge)).toEqual([]);
  });

  it('has astro:* only in pages, layouts, the middleware and .astro files', () => {
    const allowed = /^src\/(pages\/|layouts\/|middleware\.ts$)|\.astro$/;
    const wrong = edges.filter(({ from, to }) => to.startsWith('astro:') && !allowed.test(from));
    expect(wrong.map(sayEdge)).toEqual([]);
  });

  it('does not go in circles', () => {
    // A job's handler is given the services, which hold the queue: two types that name each other, no code.
    const allowed = ({ from, to, typeOnly }: Edge) =>
      typeOnly && to === 'src/server/services.ts' && from.startsWith('src/server/jobs/');
    expect(findCycles(edges.filter((edge) => edge.ours && !allowed(edge)))).toEqual([]);
  });
});

describe('The sources', () => {
  it('read process.env in src/server/env.ts alone', () => {
    const readers = source.filter((file) => /\bprocess\s*(\?\.|\.|\[\s*['"])\s*env\b/.test(readSource(file)));
    expect(readers).toEqual(['src/server/env.ts']);
  });

  it('have no grab bags', () => {
    const grabBag = /^(utils?|helpers?|common|misc|lib|shared)(\.|$)/i;
    const wrong = files.filter(
      (file) =>
        grabBag.test(basename(file)) ||
        dirname(file)
          .split('/')
          .some((name) => grabBag.test(name)),
    );
    expect(wrong).toEqual([]);
  });

  it('set no style attributes, which the policy would refuse', () => {
    const markup = filesBelow('src').filter((file) => /\.(astro|tsx)$/.test(file));
    const wrong = markup.filter((file) => /[\s{]style(=|:list=)/.test(readSource(file)));
    expect(wrong).toEqual([]);
  });
});

describe('The documents', () => {
  it.each(['README.md', 'DEVELOPERS.md'])('name in %s only paths that are there', (document) => {
    const named = pathsNamedIn(document);
    expect(named.length).toBeGreaterThan(5);
    expect(named.filter((path) => !isThere(path))).toEqual([]);
  });
});

describe('The migrations', () => {
  it('have rising times in the journal', () => {
    // One with an older time than its forerunner is skipped without a word.
    const times = journalTimes();
    expect(times).toEqual([...new Set(times)].sort((a, b) => a - b));
  });

  it('agree with the schema: drizzle-kit would generate nothing', { timeout: 60_000 }, () => {
    expect(generateOnCopy()).toContain('No schema changes');
  });
});
