import { type Edge } from './import-graph.ts';

/**
 * The ways round through a graph, each once.
 * @returns `a → b → a` a cycle
 */
export function findCycles(edges: readonly Edge[]): string[] {
  const next = new Map<string, Set<string>>();
  for (const { from, to } of edges) next.set(from, (next.get(from) ?? new Set()).add(to));
  const done = new Set<string>();
  const way: string[] = [];
  const cycles: string[] = [];
  function walk(file: string): void {
    const start = way.indexOf(file);
    if (start !== -1) cycles.push([...way.slice(start), file].join(' → '));
    if (start !== -1 || done.has(file)) return;
    way.push(file);
    for (const to of next.get(file) ?? []) walk(to);
    way.pop();
    done.add(file);
  }
  for (const file of next.keys()) walk(file);
  return cycles;
}
