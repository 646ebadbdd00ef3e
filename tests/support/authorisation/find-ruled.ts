import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { newId } from '../../../src/db/columns.ts';
import { type RuledRoute } from '../../../src/server/http/api-route.ts';
import { type Ruled } from '../../../src/server/verb.ts';
import { ROOT } from '../started-product.ts';

type AnyVerb = Ruled<unknown, unknown>;

/** One exported function of a module, found by looking. */
export interface Found<Thing> {
  /** From the checkout, such as `src/pages/api/me.ts`. */
  readonly file: string;
  readonly name: string;
  readonly thing: Thing;
}

/** Files below a folder of the checkout whose path matches, in order. */
export function sourceFiles(folder: string, matching: RegExp): string[] {
  return readdirSync(join(ROOT, folder), { recursive: true, encoding: 'utf8' })
    .map((path) => `${folder}/${path}`)
    .filter((path) => matching.test(path))
    .sort();
}

/** The text of a file of the checkout. */
export function sourceText(file: string): string {
  return readFileSync(join(ROOT, file), 'utf8');
}

/** Every exported function of some modules. */
export async function exportedFunctions(files: readonly string[]): Promise<Found<unknown>[]> {
  const modules = await Promise.all(
    files.map(async (file) => {
      const exported = (await import(/* @vite-ignore */ join(ROOT, file))) as Record<string, unknown>;
      return Object.entries(exported)
        .filter(([, thing]) => typeof thing === 'function')
        .map(([name, thing]) => ({ file, name, thing }));
    }),
  );
  return modules.flat();
}

/** An id for everything that an endpoint's path names, from where its file lies; the workshop is for the caller. */
export function paramsOf(file: string): Record<string, string> {
  return Object.fromEntries([...file.matchAll(/\[(\w+)\]/g)].map(([, name]) => [name, newId()]));
}

export function isRoute(found: Found<unknown>): found is Found<RuledRoute> {
  const route = (found.thing as Partial<RuledRoute>).route;
  return route !== undefined && isRuled(route.verb);
}

export function isVerb(found: Found<unknown>): found is Found<AnyVerb> {
  return isRuled(found.thing);
}

function isRuled(thing: unknown): boolean {
  const { rule, check } = thing as Partial<AnyVerb>;
  return typeof thing === 'function' && rule !== undefined && typeof check === 'function';
}

/** The files of ours that a file imports, as its source text says. */
export function importsOf(file: string): string[] {
  return [...sourceText(file).matchAll(/(?:from|import\()\s*'(\.[^']+)'/g)].map(([, path]) =>
    join(file, '..', path ?? ''),
  );
}
