import { readdir } from 'node:fs/promises';
import { type Bench } from '../tests/bench/support/bench.ts';

/** Runs the benches of tests/bench, or those whose names are given: `npm run bench -- public-page`. */
async function runBenches(wanted: readonly string[]): Promise<void> {
  const folder = new URL('../tests/bench/', import.meta.url);
  const files = (await readdir(folder)).filter((file) => file.endsWith('.bench.ts')).sort();
  const benches = await Promise.all(
    files.map(async (file) => ((await import(new URL(file, folder).href)) as { bench: Bench }).bench),
  );
  const names = benches.map(({ name }) => name);
  const unknown = wanted.filter((name) => !names.includes(name));
  if (unknown.length > 0) {
    console.error(`No bench is called ${unknown.join(', ')}. There are: ${names.join(', ')}.`);
    process.exitCode = 1;
    return;
  }
  for (const bench of benches.filter(({ name }) => wanted.length === 0 || wanted.includes(name))) {
    console.log(`\n${bench.name}: ${bench.what}\n`);
    // One that misses its aim fails the run, after the others have had their turn.
    if (
      !(await bench.run((line) => {
        console.log(line);
      }))
    )
      process.exitCode = 1;
  }
}

await runBenches(process.argv.slice(2));
