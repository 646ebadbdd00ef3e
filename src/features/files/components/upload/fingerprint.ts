import { FINGERPRINT_STRETCH } from '../../file.ts';

/** SHA-256 of a file's first and last MiB, in hexadecimal: quick for the largest, and enough to know it again. */
export async function fingerprintOf(file: Blob): Promise<string> {
  const first = file.slice(0, FINGERPRINT_STRETCH);
  const last = file.slice(Math.max(FINGERPRINT_STRETCH, file.size - FINGERPRINT_STRETCH));
  const bytes = await new Blob([first, last]).arrayBuffer();
  const hash = new Uint8Array(await crypto.subtle.digest('SHA-256', bytes));
  return [...hash].map((byte) => byte.toString(16).padStart(2, '0')).join('');
}
