import { createHash } from 'node:crypto';
import {
  CHECKSUM_ALGORITHMS,
  checksumElement,
  compositeChecksum,
  type Checksum,
  type ChecksumAlgorithm,
} from './checksums.ts';
import { type Segment } from './data-files.ts';
import { S3Error } from './errors.ts';
import { parseXml } from './xml.ts';

/** A part that has arrived whole. */
export type PartRecord = {
  /** 1 to 10 000. */
  readonly number: number;
  readonly etag: string;
  readonly modified: string;
  readonly checksum?: Checksum;
  readonly segment: Segment;
};

/** A part as CompleteMultipartUpload lists it. */
export type CompletedPart = { readonly number: number; readonly etag: string; readonly checksum?: Checksum };

const MIN_PART_BYTES = 5 * 1024 * 1024;
const MAX_PARTS = 10_000;

/** Reads the body of CompleteMultipartUpload. Throws MalformedXML. */
export function parsePartList(body: string): CompletedPart[] {
  const { Part: parts } = parseXml(body, 'CompleteMultipartUpload');
  const malformed = new S3Error(
    'MalformedXML',
    'The XML you provided was not well-formed or did not validate against our published schema',
  );
  if (!Array.isArray(parts) || parts.length > MAX_PARTS) throw malformed;
  return parts.map((part: unknown) => {
    const fields = (typeof part === 'object' && part !== null ? part : {}) as Record<string, unknown>;
    const { PartNumber: number, ETag: etag } = fields;
    if (typeof number !== 'string' || !/^\d{1,5}$/.test(number.trim()) || typeof etag !== 'string')
      throw malformed;
    const algorithm = CHECKSUM_ALGORITHMS.find((name) => typeof fields[checksumElement(name)] === 'string');
    const checksum = algorithm && { algorithm, value: String(fields[checksumElement(algorithm)]).trim() };
    return {
      number: Number(number),
      etag: etag.trim().replace(/^"(.*)"$/, '$1'),
      ...(checksum && { checksum }),
    };
  });
}

/**
 * The object that the listed parts make. Throws InvalidPartOrder when numbers do not rise, InvalidPart for a
 * part that was not uploaded so, EntityTooSmall for one under 5 MiB that is not the last.
 */
export function assembleParts(
  uploaded: ReadonlyMap<number, PartRecord>,
  listed: readonly CompletedPart[],
  algorithm: ChecksumAlgorithm | undefined,
): { size: number; etag: string; segments: Segment[]; checksum?: Checksum } {
  if (
    listed.some(({ number }, index) => index > 0 && number <= (listed[index - 1] as CompletedPart).number)
  ) {
    throw new S3Error(
      'InvalidPartOrder',
      'The list of parts was not in ascending order. The parts list must be specified in order by part number.',
    );
  }
  const parts = listed.map((claim) => uploadedPart(uploaded, claim, algorithm));
  for (const { number, etag, segment } of parts.slice(0, -1)) {
    if (segment.size >= MIN_PART_BYTES) continue;
    throw new S3Error('EntityTooSmall', 'Your proposed upload is smaller than the minimum allowed size', {
      ProposedSize: String(segment.size),
      MinSizeAllowed: String(MIN_PART_BYTES),
      PartNumber: String(number),
      ETag: etag,
    });
  }
  const checksums = parts.flatMap(({ checksum }) => (checksum ? [checksum.value] : []));
  return {
    size: parts.reduce((sum, { segment }) => sum + segment.size, 0),
    etag: multipartEtag(parts.map(({ etag }) => etag)),
    segments: parts.map(({ segment }) => segment),
    ...(algorithm && { checksum: compositeChecksum(algorithm, checksums) }),
  };
}

function uploadedPart(
  uploaded: ReadonlyMap<number, PartRecord>,
  claim: CompletedPart,
  algorithm: ChecksumAlgorithm | undefined,
): PartRecord {
  const part = uploaded.get(claim.number);
  const sameChecksum =
    claim.checksum === undefined ||
    (claim.checksum.algorithm === part?.checksum?.algorithm && claim.checksum.value === part.checksum.value);
  const hasChecksum = algorithm === undefined || part?.checksum?.algorithm === algorithm;
  if (part?.etag === claim.etag && sameChecksum && hasChecksum) return part;
  throw new S3Error(
    'InvalidPart',
    "One or more of the specified parts could not be found. The part may not have been uploaded, or the specified entity tag may not match the part's entity tag.",
    { PartNumber: String(claim.number), ETag: claim.etag },
  );
}

/** ETag of an object made of parts: MD5 of the parts' MD5s in order, and their number. */
export function multipartEtag(etags: readonly string[]): string {
  const md5 = createHash('md5');
  for (const etag of etags) md5.update(Buffer.from(etag, 'hex'));
  return `${md5.digest('hex')}-${String(etags.length)}`;
}
