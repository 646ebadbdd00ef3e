// The front server in a process of its own, with one page. Arguments: port, path, file with the page, empty
// client folder, log file.
import { readFileSync } from 'node:fs';
import { pino } from 'pino';
import { bufferLines } from '../../../src/server/http/buffered-log.ts';
import { ChangeCounter } from '../../../src/server/http/change-counter.ts';
import { startFrontServer } from '../../../src/server/http/front-server.ts';

const [port, path, pageFile, clientDir, logFile] = process.argv.slice(2) as [
  string,
  string,
  string,
  string,
  string,
];
const page = readFileSync(pageFile);
const changes = new ChangeCounter();
const destination = bufferLines(pino.destination(logFile));

const front = await startFrontServer({
  host: '127.0.0.1',
  port: Number(port),
  publicUrl: `http://127.0.0.1:${port}`,
  trustedProxies: [],
  clientDir,
  changes: {
    live: true,
    counter: () => changes.counter(),
    movedSince: (tags, since) => changes.movedSince(tags, since),
    subscribe: (listener) => changes.subscribe(listener),
    close: () => Promise.resolve(),
  },
  isHealthy: () => true,
  isPublicPage: (asked) => asked === path,
  log: pino({ base: null }, destination),
  render: (_req, res) => {
    res.writeHead(200, {
      'content-type': 'text/html; charset=utf-8',
      // Of the size that a page's hashes have.
      'content-security-policy': `default-src 'self'; script-src 'self' 'sha256-${'A'.repeat(43)}='; style-src 'self' 'sha256-${'B'.repeat(43)}='; frame-ancestors 'none'`,
      'x-page-tags': 'build:bench',
    });
    res.end(page);
  },
});

process.once('SIGTERM', () => {
  void front.close().then(() => process.exit(0));
});
