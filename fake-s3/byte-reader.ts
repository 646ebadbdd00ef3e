import { S3Error } from './errors.ts';

/** Reads lines and runs of bytes from a stream, holding no more than one of its pieces and one line. */
export class ByteReader {
  readonly #source: AsyncIterator<Buffer>;
  #held: Buffer = Buffer.alloc(0);

  constructor(source: AsyncIterable<Buffer>) {
    this.#source = source[Symbol.asyncIterator]();
  }

  /** The next line without its CR LF. Throws IncompleteBody at the end or past `max` bytes. */
  async line(max: number): Promise<string> {
    for (;;) {
      const end = this.#held.indexOf('\r\n');
      if (end >= 0) {
        const line = this.#held.toString('latin1', 0, end);
        this.#held = this.#held.subarray(end + 2);
        return line;
      }
      if (this.#held.length > max) throw incomplete();
      const more = await this.#next();
      if (!more) throw incomplete();
      this.#held = this.#held.length === 0 ? more : Buffer.concat([this.#held, more]);
    }
  }

  /** At least one and at most `max` bytes. Throws IncompleteBody at the end. */
  async some(max: number): Promise<Buffer> {
    if (this.#held.length === 0) {
      const more = await this.#next();
      if (!more) throw incomplete();
      this.#held = more;
    }
    const bytes = this.#held.subarray(0, max);
    this.#held = this.#held.subarray(bytes.length);
    return bytes;
  }

  /** Makes sure that nothing follows. Throws IncompleteBody when something does. */
  async end(): Promise<void> {
    if (this.#held.length > 0 || (await this.#next())) throw incomplete();
  }

  async #next(): Promise<Buffer | undefined> {
    for (;;) {
      const result = await this.#source.next();
      if (result.done) return undefined;
      if (result.value.length > 0) return result.value;
    }
  }
}

function incomplete(): S3Error {
  return new S3Error('IncompleteBody', 'The request body terminated unexpectedly');
}
