/** The tag that stands for every public page at once. */
export const EVERY_PAGE = '*';

export type PageChangeListener = (tags: readonly string[]) => void;

/** What the page cache needs to know about changes to what is published. */
export type PageChanges = {
  /** Whether changes are being heard. While they are not, no page may be kept. */
  readonly live: boolean;
  /** The number of the newest change heard. */
  counter(): number;
  /** Whether one of the tags has changed after the change with the number `since`. */
  movedSince(tags: readonly string[], since: number): boolean;
  /** Calls the listener with the tags of each change (`*` is every page); gives a function that ends it. */
  subscribe(listener: PageChangeListener): () => void;
  /** Stops listening. */
  close(): Promise<void>;
};

/** Tags remembered one by one; past that the oldest are folded into one number. */
const REMEMBERED_TAGS = 10_000;

/** Numbers changes as they are heard and remembers when each tag last moved. */
export class ChangeCounter {
  #counter = 0;
  /** Tags that are not in the map count as moved at this number. */
  #floor = 0;
  readonly #moved = new Map<string, number>();
  readonly #listeners = new Set<PageChangeListener>();

  constructor(private readonly remembered = REMEMBERED_TAGS) {}

  counter(): number {
    return this.#counter;
  }

  /** Notes one change and tells the listeners. `*` among the tags moves all of them. */
  move(tags: readonly string[]): void {
    this.#counter += 1;
    if (tags.includes(EVERY_PAGE)) {
      this.#moved.clear();
      this.#floor = this.#counter;
    } else {
      for (const tag of tags) this.#remember(tag);
    }
    for (const listener of this.#listeners) listener(tags);
  }

  movedSince(tags: readonly string[], since: number): boolean {
    return tags.some((tag) => (this.#moved.get(tag) ?? this.#floor) > since);
  }

  subscribe(listener: PageChangeListener): () => void {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  }

  #remember(tag: string): void {
    this.#moved.delete(tag);
    this.#moved.set(tag, this.#counter);
    if (this.#moved.size <= this.remembered) return;
    const [oldest] = this.#moved;
    if (oldest === undefined) return;
    this.#moved.delete(oldest[0]);
    // Forgetting a tag may only make pages look older than they are, never newer.
    this.#floor = Math.max(this.#floor, oldest[1]);
  }
}
