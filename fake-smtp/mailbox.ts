import { randomUUID } from 'node:crypto';
import { createWriteStream } from 'node:fs';
import { access, constants, mkdir, open, readdir, readFile, rename, rm } from 'node:fs/promises';
import path from 'node:path';
import type { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { v7 } from 'uuid';

/** Who the SMTP conversation named; the headers of the message may say otherwise. */
export type Envelope = { readonly from: string; readonly to: readonly string[] };

/** A message that is wholly on disk. `id` is a UUIDv7; `name` is its file's name without the ending. */
export type Kept = {
  readonly id: string;
  readonly name: string;
  readonly receivedAt: Date;
  readonly envelope: Envelope;
};

/** Which messages are meant: for one recipient, newer than an id or not before an instant, older than an id. */
export type Wanted = { readonly to?: string; readonly after?: string | Date; readonly before?: string };

function arrivalOf(id: string): Date {
  return new Date(Number.parseInt(id.replaceAll('-', '').slice(0, 12), 16));
}

function nameOf(id: string): string {
  return `${arrivalOf(id).toISOString().replace(/[-:.]/g, '')}-${id}`;
}

function isWanted(kept: Kept, { to, after, before }: Wanted): boolean {
  if (to !== undefined && !kept.envelope.to.some((one) => one.toLowerCase() === to.toLowerCase()))
    return false;
  if (typeof after === 'string' && kept.id <= after) return false;
  if (after instanceof Date && kept.receivedAt < after) return false;
  return before === undefined || kept.id < before;
}

async function sync(target: string): Promise<void> {
  const handle = await open(target, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
}

/** Reads what an earlier run kept, and removes what it had not finished. */
async function readFolder(folder: string): Promise<Kept[]> {
  const files = new Set(await readdir(folder));
  const kept: Kept[] = [];
  for (const file of [...files].sort()) {
    const { name, ext } = path.parse(file);
    if (ext === '.tmp' || (ext === '.json' && !files.has(`${name}.eml`))) await rm(path.join(folder, file));
    if (ext !== '.json' || !files.has(`${name}.eml`)) continue;
    const envelope = JSON.parse(await readFile(path.join(folder, file), 'utf8')) as Envelope;
    const id = name.slice(name.indexOf('-') + 1);
    kept.push({ id, name, receivedAt: arrivalOf(id), envelope });
  }
  return kept;
}

/**
 * The messages in one folder: `{time}-{id}.eml` as received, `{time}-{id}.json` with the envelope beside it.
 * One process a folder. Throws when the folder cannot be made or written to.
 */
export async function openMailbox(folder: string) {
  await mkdir(folder, { recursive: true });
  await access(folder, constants.W_OK);
  let kept = await readFolder(folder);
  const listeners = new Set<(message: Kept) => void>();

  async function store(temporary: string, envelope: Envelope): Promise<Kept> {
    const id = v7();
    const name = nameOf(id);
    const target = path.join(folder, name);
    // The envelope is there before the message: a message on disk is always whole.
    const handle = await open(`${target}.json.tmp`, 'wx');
    try {
      await handle.writeFile(JSON.stringify(envelope));
      await handle.sync();
    } finally {
      await handle.close();
    }
    await rename(`${target}.json.tmp`, `${target}.json`);
    await rename(temporary, `${target}.eml`);
    await sync(folder);
    const message = { id, name, receivedAt: arrivalOf(id), envelope };
    kept.push(message);
    kept.sort((a, b) => (a.name < b.name ? -1 : 1));
    for (const listener of listeners) listener(message);
    return message;
  }

  return {
    /**
     * Takes in one message; it counts as kept when this comes back.
     * @param isWhole asked at the end of the stream; false throws the message away
     * @returns undefined when it was thrown away
     */
    async keep(source: Readable, envelope: Envelope, isWhole: () => boolean): Promise<Kept | undefined> {
      const temporary = path.join(folder, `${randomUUID()}.tmp`);
      try {
        await pipeline(source, createWriteStream(temporary, { flags: 'wx', flush: true }));
        return isWhole() ? await store(temporary, envelope) : undefined;
      } finally {
        await rm(temporary, { force: true });
      }
    },

    /** The newest messages first, `limit` at most. */
    list(wanted: Wanted, limit: number): Kept[] {
      const found: Kept[] = [];
      for (let index = kept.length - 1; index >= 0 && found.length < limit; index -= 1) {
        const message = kept[index];
        if (message && isWanted(message, wanted)) found.push(message);
      }
      return found;
    },

    count: () => kept.length,
    find: (id: string) => kept.find((message) => message.id === id),
    raw: (message: Kept) => readFile(path.join(folder, `${message.name}.eml`)),

    /** Comes back when a wanted message is here, or when the signal says that nobody waits any more. */
    async arrival(wanted: Wanted, signal: AbortSignal): Promise<void> {
      if (signal.aborted || kept.some((message) => isWanted(message, wanted))) return;
      await new Promise<void>((resolve) => {
        const done = () => {
          listeners.delete(listener);
          signal.removeEventListener('abort', done);
          resolve();
        };
        const listener = (message: Kept) => {
          if (isWanted(message, wanted)) done();
        };
        listeners.add(listener);
        signal.addEventListener('abort', done);
      });
    },

    /** Deletes every message, on disk too. */
    async clear(): Promise<void> {
      const gone = kept;
      kept = [];
      for (const { name } of gone) {
        await rm(path.join(folder, `${name}.eml`), { force: true });
        await rm(path.join(folder, `${name}.json`), { force: true });
      }
    },
  };
}

export type Mailbox = Awaited<ReturnType<typeof openMailbox>>;
