import { callApi } from '../../../../client/call-api.ts';
import { paths } from '../../../../paths.ts';
import { partCountFor, SIGNED_AT_ONCE, SignedParts } from '../../file.ts';
import { type FilesOf } from '../../queries.ts';

/** Well inside the hour for which an address holds. */
const FRESH_MS = 45 * 60_000;

type Batch = { readonly at: number; readonly urls: Promise<ReadonlyMap<number, string>> };

/** Gets the addresses of parts, twenty in one request, for as long as they hold. */
export function openPartSigner(of: FilesOf) {
  const batches = new Map<string, Batch>();

  async function ask(file: string, numbers: readonly number[]): Promise<ReadonlyMap<number, string>> {
    const path = paths.api.inBuild(of.workshop, of.build, `files/${file}/sign`);
    const { parts } = SignedParts.parse(await callApi(path, { numbers }));
    return new Map(parts.map(({ number, url }) => [number, url]));
  }

  return {
    /** @param fresh throws away an address that the storage no longer takes */
    async sign(file: string, bytes: number, number: number, fresh = false): Promise<string> {
      const key = `${file}:${String(number)}`;
      let batch = batches.get(key);
      if (fresh || batch === undefined || Date.now() - batch.at > FRESH_MS) {
        const last = Math.min(partCountFor(bytes), number + SIGNED_AT_ONCE - 1);
        const numbers = Array.from({ length: last - number + 1 }, (_none, index) => number + index);
        batch = { at: Date.now(), urls: ask(file, numbers) };
        for (const one of numbers) batches.set(`${file}:${String(one)}`, batch);
      }
      try {
        const url = (await batch.urls).get(number);
        if (url === undefined) throw new Error('The server did not sign this part.');
        return url;
      } catch (error) {
        batches.delete(key);
        throw error;
      }
    },
  };
}
