import { createHash } from 'node:crypto';
import { crc32, crc32c, crc64nvme, type RunningChecksum } from './crc.ts';
import { S3Error } from './errors.ts';

/** The additional checksums of S3: how each is computed and how many bytes it has. */
const ALGORITHMS = {
  crc32: { start: crc32, bytes: 4 },
  crc32c: { start: crc32c, bytes: 4 },
  crc64nvme: { start: crc64nvme, bytes: 8 },
  sha1: { start: (): RunningChecksum => createHash('sha1'), bytes: 20 },
  sha256: { start: (): RunningChecksum => createHash('sha256'), bytes: 32 },
} as const;

export type ChecksumAlgorithm = keyof typeof ALGORITHMS;

/** A checksum of an object or part; base64, followed by `-parts` when made of the checksums of parts. */
export type Checksum = { readonly algorithm: ChecksumAlgorithm; readonly value: string };

const HEADER_PREFIX = 'x-amz-checksum-';

/** Starts computing a checksum over bytes as they pass. */
export function startChecksum(algorithm: ChecksumAlgorithm): RunningChecksum {
  return ALGORITHMS[algorithm].start();
}

/** The header or trailer field of an algorithm, lower case. */
export function checksumHeader(algorithm: ChecksumAlgorithm): string {
  return HEADER_PREFIX + algorithm;
}

/** The element of an algorithm in S3's XML, as `ChecksumCRC32C`. */
export function checksumElement(algorithm: ChecksumAlgorithm): string {
  return `Checksum${algorithm.toUpperCase()}`;
}

/** Every algorithm, for looking through headers and elements. */
export const CHECKSUM_ALGORITHMS = Object.keys(ALGORITHMS) as readonly ChecksumAlgorithm[];

/** The algorithm that a header such as `x-amz-checksum-algorithm: CRC32C` names. Throws InvalidRequest. */
export function parseAlgorithm(name: string): ChecksumAlgorithm {
  const found = CHECKSUM_ALGORITHMS.find((algorithm) => algorithm === name.toLowerCase());
  if (!found) throw new S3Error('InvalidRequest', 'Checksum algorithm provided is unsupported.');
  return found;
}

/**
 * The one checksum announced among headers or trailers, or undefined. Throws InvalidRequest when there are
 * several, or when the value is not base64 of the algorithm's length.
 */
export function announcedChecksum(header: (name: string) => string | undefined): Checksum | undefined {
  const found = CHECKSUM_ALGORITHMS.flatMap((algorithm) => {
    const value = header(checksumHeader(algorithm));
    return value === undefined ? [] : [{ algorithm, value }];
  });
  const [first, second] = found;
  if (!first) return undefined;
  if (second) {
    throw new S3Error(
      'InvalidRequest',
      'Expecting a single x-amz-checksum- header. Multiple checksum Types are not allowed.',
    );
  }
  if (!isBase64Of(first.value, ALGORITHMS[first.algorithm].bytes)) {
    throw new S3Error('InvalidRequest', `Value for ${checksumHeader(first.algorithm)} header is invalid.`);
  }
  return first;
}

/** Whether a text is the base64 form of exactly so many bytes. */
export function isBase64Of(text: string, bytes: number): boolean {
  const decoded = Buffer.from(text, 'base64');
  return decoded.length === bytes && decoded.toString('base64') === text;
}

/** The checksum of a multipart object: that of its parts' checksums in order, with their number behind it. */
export function compositeChecksum(algorithm: ChecksumAlgorithm, parts: readonly string[]): Checksum {
  const running = startChecksum(algorithm);
  for (const part of parts) running.update(Buffer.from(part, 'base64'));
  return { algorithm, value: `${running.digest().toString('base64')}-${String(parts.length)}` };
}

/** Whether an algorithm can be combined from parts in the COMPOSITE way; CRC64NVME exists for whole objects only. */
export function isComposable(algorithm: ChecksumAlgorithm): boolean {
  return algorithm !== 'crc64nvme';
}
