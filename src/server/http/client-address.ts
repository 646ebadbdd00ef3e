import { type IncomingMessage } from 'node:http';
import { isIP } from 'node:net';
import proxyAddr from 'proxy-addr';

/** Headers by which proxies speak of the client or the address asked for. Only ours reach the application. */
const SPOOFABLE =
  /^(x-forwarded-|forwarded$|x-real-ip$|x-client-ip$|x-cluster-client-ip$|true-client-ip$|cf-connecting-ip$|x-original-|x-rewrite-url$|x-request-id$)/;

/** An address as an IP: without the port some proxies add, a zone, or IPv6's wrapping of IPv4. */
function plainAddress(text: string): string | null {
  const unwrapped = text
    .trim()
    .replace(/^\[(.*)\](:\d+)?$/, '$1')
    .replace(/^(\d+\.\d+\.\d+\.\d+):\d+$/, '$1')
    .replace(/%.*$/, '')
    .replace(/^::ffff:(?=\d+\.\d+\.\d+\.\d+$)/i, '');
  return isIP(unwrapped) === 0 ? null : unwrapped;
}

/**
 * Makes the function that says who is asking: the right-most X-Forwarded-For entry that is not a trusted proxy,
 * believed only when the connection itself comes from one.
 * @param trustedProxies addresses and CIDR ranges
 * @throws TypeError for one that is neither
 */
export function clientAddressFinder(trustedProxies: readonly string[]): (req: IncomingMessage) => string {
  const trust = proxyAddr.compile([...trustedProxies]);
  return (req) => {
    const peer = plainAddress(req.socket.remoteAddress ?? '') ?? '';
    // The socket is gone already; nobody will read the answer.
    if (peer === '') return '';
    return plainAddress(proxyAddr(req, trust)) ?? peer;
  };
}

/** Replaces whatever the client says about itself and the address it asked for by what the front server knows. */
export function overwriteForwardedHeaders(req: IncomingMessage, clientAddress: string, publicUrl: URL): void {
  for (const name of Object.keys(req.headers)) {
    if (SPOOFABLE.test(name)) Reflect.deleteProperty(req.headers, name);
  }
  req.headers.host = publicUrl.host;
  req.headers['x-forwarded-for'] = clientAddress;
  req.headers['x-forwarded-host'] = publicUrl.host;
  req.headers['x-forwarded-proto'] = publicUrl.protocol.slice(0, -1);
}
