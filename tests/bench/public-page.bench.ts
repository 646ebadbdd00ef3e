import { type Bench } from './support/bench.ts';
import { besideNginx, CONNECTIONS, ROUNDS, SECONDS } from './support/beside-nginx.ts';

/** An episode's page in size and in how well it compresses: about 28 kB. */
function makePage(): string {
  const rows = Array.from({ length: 400 }, (_item, at) => {
    const minute = String(Math.floor(at / 4)).padStart(2, '0');
    const second = String((at * 15) % 60).padStart(2, '0');
    return `<li data-at="${String(at * 360)}"><a href="?t=${minute}:${second}">${minute}:${second}</a> Face ${String((at * 7919) % 1009)} to size</li>`;
  });
  return `<!doctype html><html lang="en"><title>Episode 3</title><main><ol>${rows.join('\n')}</ol></main></html>`;
}

/** Holds a kept page and its 304 to half of what nginx does with the same bytes and headers on the same core. */
export const bench: Bench = {
  name: 'public-page',
  what: `a kept page beside the same file from nginx, one core each, median of ${String(ROUNDS)} rounds of ${String(SECONDS)} s, ${String(CONNECTIONS)} connections kept open`,
  run: (print) => besideNginx(makePage(), print),
};
