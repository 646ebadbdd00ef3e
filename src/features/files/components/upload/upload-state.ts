import { sayBytes } from '../../../../domain/byte-sizes.ts';

/** A file that is being sent, as far as its row shows it. */
export interface SentFile {
  readonly bytes: number;
  /** Bytes of parts that the storage has confirmed. */
  readonly confirmed: number;
  readonly paused: boolean;
  readonly waiting: boolean;
  /** Why it stands still, when nobody paused it. */
  readonly stopped: string | null;
}

export type UploadSituation = 'sending' | 'finishing' | 'waiting' | 'paused' | 'stopped';

/** What is going on with a file: what holds it up comes first. */
export function situationOf(file: SentFile): UploadSituation {
  if (file.stopped !== null) return 'stopped';
  if (file.paused) return 'paused';
  if (file.waiting) return 'waiting';
  return file.confirmed >= file.bytes ? 'finishing' : 'sending';
}

const SENTENCES: Readonly<Record<Exclude<UploadSituation, 'stopped'>, string>> = {
  sending: '',
  finishing: 'All of it is there. Putting it together.',
  waiting: 'No connection. It goes on by itself when there is one.',
  paused: 'Paused. What was sent is kept.',
};

/** What to say under a file's bar; empty while it simply goes on. */
export function saySituation(file: SentFile): string {
  const situation = situationOf(file);
  return situation === 'stopped' ? (file.stopped ?? '') : SENTENCES[situation];
}

/** How far it is, in words. */
export function sayConfirmed({ confirmed, bytes }: Pick<SentFile, 'confirmed' | 'bytes'>): string {
  return `${sayBytes(confirmed)} of ${sayBytes(bytes)}`;
}
