import { randomUUID } from 'node:crypto';
import { createReadStream } from 'node:fs';
import { constants, copyFile, link, open, readdir, rename, rm } from 'node:fs/promises';
import { join } from 'node:path';
import { ensureFolder, syncFolder } from './record-files.ts';

/** A stretch of an object's bytes: a file with a random name, whole. An object is one or several in order. */
export type Segment = { readonly file: string; readonly size: number };

/** A file being written. `commit` gives it its name; `discard` without a commit leaves nothing of it. */
export type DataWriter = {
  write(bytes: Buffer): Promise<void>;
  commit(): Promise<Segment>;
  discard(): Promise<void>;
};

/**
 * The bytes of objects and parts, in files that never change once they have their name. Records point at
 * them; a file that no record points at is invisible and is swept away at the next start.
 */
export class DataFiles {
  readonly #folder: string;
  readonly tempFolder: string;
  readonly #readers = new Map<string, number>();
  readonly #doomed = new Set<string>();

  private constructor(folder: string, tempFolder: string) {
    this.#folder = folder;
    this.tempFolder = tempFolder;
  }

  /** Opens the two folders under `root` and clears what an interrupted run left unfinished. */
  static async open(root: string): Promise<DataFiles> {
    const tempFolder = await ensureFolder(root, 'temp');
    for (const name of await readdir(tempFolder)) await rm(join(tempFolder, name), { force: true });
    return new DataFiles(await ensureFolder(root, 'data'), tempFolder);
  }

  /** Removes every file that is not among those in use. Only at start, before anything is written. */
  async sweep(inUse: ReadonlySet<string>): Promise<void> {
    for (const name of await readdir(this.#folder)) {
      if (!inUse.has(name)) await rm(join(this.#folder, name), { force: true });
    }
  }

  async create(): Promise<DataWriter> {
    const name = randomUUID();
    const temporary = join(this.tempFolder, name);
    const handle = await open(temporary, 'wx');
    let size = 0;
    let committed = false;
    return {
      write: async (bytes) => {
        for (let done = 0; done < bytes.length;) {
          done += (await handle.write(bytes, done, bytes.length - done)).bytesWritten;
        }
        size += bytes.length;
      },
      commit: async () => {
        await handle.sync();
        await handle.close();
        await rename(temporary, join(this.#folder, name));
        await syncFolder(this.#folder);
        committed = true;
        return { file: name, size };
      },
      discard: async () => {
        if (committed) return;
        await handle.close().catch(() => undefined);
        await rm(temporary, { force: true });
      },
    };
  }

  /** Gives the same bytes further names, without copying them where the file system can link. */
  async duplicate(segments: readonly Segment[]): Promise<Segment[]> {
    const copies: Segment[] = [];
    for (const { file, size } of segments) {
      const name = randomUUID();
      const [from, to] = [join(this.#folder, file), join(this.#folder, name)];
      await link(from, to).catch(() => copyFile(from, to, constants.COPYFILE_FICLONE));
      copies.push({ file: name, size });
    }
    await syncFolder(this.#folder);
    return copies;
  }

  /** Keeps files readable, even if removed meanwhile, until the returned function is called once. */
  hold(segments: readonly Segment[]): () => Promise<void> {
    for (const { file } of segments) this.#readers.set(file, (this.#readers.get(file) ?? 0) + 1);
    return async () => {
      for (const { file } of segments) {
        const left = (this.#readers.get(file) ?? 1) - 1;
        if (left > 0) this.#readers.set(file, left);
        else this.#readers.delete(file);
      }
      const ended = segments.filter(({ file }) => this.#doomed.has(file) && !this.#readers.has(file));
      for (const { file } of ended) this.#doomed.delete(file);
      await this.#unlink(ended);
    };
  }

  /** Removes files, those being read once their last reader is done. */
  async remove(segments: readonly Segment[]): Promise<void> {
    const held = segments.filter(({ file }) => this.#readers.has(file));
    for (const { file } of held) this.#doomed.add(file);
    await this.#unlink(segments.filter(({ file }) => !this.#readers.has(file)));
  }

  /** Yields the bytes from `start` to `end` (both included) of segments in order. Hold them meanwhile. */
  async *read(segments: readonly Segment[], start: number, end: number): AsyncGenerator<Buffer> {
    let offset = 0;
    for (const { file, size } of segments) {
      const from = Math.max(start - offset, 0);
      const to = Math.min(end - offset, size - 1);
      offset += size;
      if (from > to) continue;
      yield* createReadStream(join(this.#folder, file), { start: from, end: to }) as AsyncIterable<Buffer>;
    }
  }

  async #unlink(segments: readonly Segment[]): Promise<void> {
    for (const { file } of segments) await rm(join(this.#folder, file), { force: true });
  }
}
