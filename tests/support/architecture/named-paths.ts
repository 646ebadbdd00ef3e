import { existsSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { ROOT } from '../started-product.ts';
import { readSource } from './import-graph.ts';

const CODE_SPAN = /`([^`\n]+)`/g;
const PATH = /^[\w.@[\]*-]+(\/[\w.@[\]*-]+)*\/?$/;

/** Made by running the product, so absent from a fresh checkout. */
const MADE_LATER = /^(\.data|\.astro|dist|node_modules|test-results)(\/|$)/;

function isPath(span: string, top: ReadonlySet<string>): boolean {
  if (!PATH.test(span) || MADE_LATER.test(span)) return false;
  const [first = ''] = span.split('/');
  return top.has(first) || (span.includes('/') && /\.(md|mjs|ts|tsx|astro|json|css|sql)$/.test(span));
}

/** The paths that a document names in `code`, from the checkout; one with a * counts up to its folder. */
export function pathsNamedIn(document: string): string[] {
  const top = new Set(readdirSync(ROOT));
  const spans = [...readSource(document).matchAll(CODE_SPAN)].map(([, span = '']) => span);
  return [...new Set(spans.filter((span) => isPath(span, top)))];
}

/** Whether a path from the checkout is there. */
export function isThere(path: string): boolean {
  return existsSync(join(ROOT, path.replace(/\/[^/]*\*.*$/, '')));
}
