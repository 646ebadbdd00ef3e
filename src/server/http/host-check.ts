import { isLoopback } from '../env.ts';

export type HostVerdict = 'ours' | 'another loopback name' | 'not ours';

/** A Host header as name and port; the port that the scheme implies is written out. */
function parseHost(host: string, protocol: string): { name: string; port: string } | null {
  const match = /^(\[[\da-f:.]+\]|[^:[\]/@\s]+)(?::(\d{1,5}))?$/i.exec(host);
  if (match?.[1] === undefined) return null;
  return { name: match[1].toLowerCase(), port: match[2] ?? (protocol === 'https:' ? '443' : '80') };
}

/**
 * Makes the function that judges a Host header against PUBLIC_URL.
 * Another name of this machine with the same port is told apart when PUBLIC_URL is itself on this machine.
 */
export function hostChecker(publicUrl: URL): (host: string | undefined) => HostVerdict {
  const ours = parseHost(publicUrl.host, publicUrl.protocol);
  return (host) => {
    const asked = host === undefined ? null : parseHost(host, publicUrl.protocol);
    if (asked === null || ours === null || asked.port !== ours.port) return 'not ours';
    if (asked.name === ours.name) return 'ours';
    return isLoopback(ours.name) && isLoopback(asked.name) ? 'another loopback name' : 'not ours';
  };
}
