/** Runs work one at a time for each key, in the order asked; work under different keys runs side by side. */
export class KeyedLock {
  readonly #tails = new Map<string, Promise<unknown>>();

  async run<T>(key: string, work: () => Promise<T>): Promise<T> {
    const before = this.#tails.get(key) ?? Promise.resolve();
    const mine = before.then(work, work);
    this.#tails.set(key, mine);
    try {
      return await mine;
    } finally {
      if (this.#tails.get(key) === mine) this.#tails.delete(key);
    }
  }
}
