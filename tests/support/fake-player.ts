import { createServer, type Server } from 'node:http';
import { type AddressInfo } from 'node:net';

/** A page that plays a minute, speaks the open player messages unless it is told to be quiet, and shows what it was told. */
function playerPage(quiet: boolean): string {
  return `<!doctype html>
<html lang="en"><title>Another host</title>
<p>Here: <output id="here">0</output></p>
<label>Second <input id="second" type="number"></label>
<script>
  const here = document.getElementById('here');
  const second = document.getElementById('second');
  const listeners = new Map();
  const quiet = ${String(quiet)};
  const say = (message) => quiet || parent.postMessage(
    JSON.stringify({ context: 'player.js', version: '0.0.11', ...message }), '*');
  const tell = () => {
    if (listeners.has('timeupdate'))
      say({ event: 'timeupdate', value: { seconds: Number(here.value), duration: 60 }, listener: listeners.get('timeupdate') });
  };
  addEventListener('message', ({ data }) => {
    const { method, value, listener } = JSON.parse(data);
    if (method === 'addEventListener') listeners.set(value, listener);
    if (method === 'setCurrentTime') { here.value = String(value); tell(); }
    if (method === 'getDuration') say({ event: 'getDuration', value: 60, listener });
  });
  second.addEventListener('change', () => { here.value = second.value; tell(); });
  say({ event: 'ready', value: { src: location.href, events: ['ready', 'timeupdate'], methods: ['setCurrentTime'] } });
</script></html>`;
}

export interface FakePlayer {
  readonly origin: string;
  /** The address of a video there; a quiet one never says a word. */
  readonly address: (quiet?: boolean) => string;
  readonly close: () => void;
}

/** A video host of the tests' own, on its own loopback origin. */
export async function startFakePlayer(): Promise<FakePlayer> {
  const server: Server = createServer((req, res) => {
    const quiet = req.url?.startsWith('/quiet') ?? false;
    res.writeHead(200, { 'content-type': 'text/html; charset=utf-8' }).end(playerPage(quiet));
  });
  await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
  const origin = `http://127.0.0.1:${String((server.address() as AddressInfo).port)}`;
  return {
    origin,
    address: (quiet = false) => `${origin}/${quiet ? 'quiet' : 'watch'}/1`,
    close: () => {
      server.closeAllConnections();
      server.close();
    },
  };
}
