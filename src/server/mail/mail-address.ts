const LOCAL = /^[^\s\p{C}()<>[\]:;@\\,."]+(\.[^\s\p{C}()<>[\]:;@\\,."]+)*$/u;
const LABEL = /^[\p{L}\p{N}]([\p{L}\p{N}\p{M}-]{0,61}[\p{L}\p{N}\p{M}])?$/u;

/**
 * Whether a text is one bare mail address with a domain of at least two labels. Quoted local parts and
 * address literals are lawful but never a person's, and are refused.
 */
export function isMailAddress(text: string): boolean {
  const at = text.lastIndexOf('@');
  const local = text.slice(0, Math.max(at, 0));
  const domain = text.slice(at + 1);
  const labels = domain.split('.');
  return (
    text.length <= 254 &&
    new TextEncoder().encode(local).length <= 64 &&
    LOCAL.test(local) &&
    labels.length >= 2 &&
    labels.every((label) => LABEL.test(label))
  );
}

/** An address as a log may hold it: the first letter and the domain. */
export function maskAddress(address: string): string {
  const at = address.lastIndexOf('@');
  if (at < 1) return '…';
  return `${[...address][0] ?? ''}…@${address.slice(at + 1)}`;
}

/** A server's answer as a log may hold it: one line, addresses masked, links dropped, 200 characters. */
export function maskAnswer(answer: string): string {
  return answer
    .replace(/\s+/g, ' ')
    .replace(/\b[a-z][a-z0-9+.-]*:\/\/\S+/gi, '(link)')
    .replace(/[^\s<>()"',;:=]+@[^\s<>()"',;:]+/g, maskAddress)
    .slice(0, 200);
}
