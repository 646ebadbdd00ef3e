import { LRUCache } from 'lru-cache';
import { EVERY_PAGE } from './change-counter.ts';
import { keptSize, type KeptPage } from './page-forms.ts';

/** Memory for kept pages. */
export const DEFAULT_CACHE_BYTES = 128 * 1024 * 1024;

/** The longest that a page is kept, whatever was heard of changes. */
const LIFETIME_MS = 5 * 60 * 1000;

type Entry = { readonly page: KeptPage; readonly tags: readonly string[] };

/** Pages by path, the ones asked for least lately dropped when memory is used up, each dropped by its tags. */
export class PageCache {
  readonly #pathsByTag = new Map<string, Set<string>>();
  readonly #entries: LRUCache<string, Entry>;

  constructor(maxBytes = DEFAULT_CACHE_BYTES, lifetimeMs = LIFETIME_MS) {
    this.#entries = new LRUCache({
      maxSize: maxBytes,
      sizeCalculation: (entry, path) => keptSize(entry.page) + path.length,
      ttl: lifetimeMs,
      // Reading the clock once a second is exact enough for minutes.
      ttlResolution: Math.min(1_000, lifetimeMs / 10),
      dispose: (entry, path) => {
        this.#forget(path, entry.tags);
      },
    });
  }

  get(path: string): KeptPage | undefined {
    return this.#entries.get(path)?.page;
  }

  keep(path: string, page: KeptPage, tags: readonly string[]): void {
    this.#entries.set(path, { page, tags });
    // A page larger than the whole cache is not taken in.
    if (!this.#entries.has(path)) return;
    for (const tag of tags) {
      const paths = this.#pathsByTag.get(tag) ?? new Set();
      this.#pathsByTag.set(tag, paths.add(path));
    }
  }

  /** Drops every page with one of the tags; `*` drops all. */
  drop(tags: readonly string[]): void {
    if (tags.includes(EVERY_PAGE)) {
      this.#entries.clear();
      return;
    }
    for (const tag of tags) {
      for (const path of [...(this.#pathsByTag.get(tag) ?? [])]) this.#entries.delete(path);
    }
  }

  /** Pages kept, their bytes, and tags indexed. */
  size(): { pages: number; bytes: number; tags: number } {
    return {
      pages: this.#entries.size,
      bytes: this.#entries.calculatedSize,
      tags: this.#pathsByTag.size,
    };
  }

  #forget(path: string, tags: readonly string[]): void {
    for (const tag of tags) {
      const paths = this.#pathsByTag.get(tag);
      paths?.delete(path);
      if (paths?.size === 0) this.#pathsByTag.delete(tag);
    }
  }
}
