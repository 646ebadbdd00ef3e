import { S3Error } from './errors.ts';

/** First and last byte, both included, counted from 0. */
export type ByteRange = { readonly start: number; readonly end: number };

/**
 * The part of an object of `size` bytes that a Range header asks for (RFC 9110 section 14). Undefined for the
 * whole: no header, another unit, several ranges or a malformed one, which S3 ignores. Throws InvalidRange when it
 * lies outside.
 */
export function parseRange(header: string | undefined, size: number): ByteRange | undefined {
  const match = /^bytes=(\d*)-(\d*)$/.exec(header?.trim() ?? '');
  if (!match || (match[1] === '' && match[2] === '')) return undefined;
  const [first, last] = [match[1] ?? '', match[2] ?? ''];
  const start = first === '' ? Math.max(size - Number(last), 0) : Number(first);
  const end = first === '' || last === '' ? size - 1 : Math.min(Number(last), size - 1);
  if (first !== '' && last !== '' && Number(last) < Number(first)) return undefined;
  if (start >= size) {
    throw new S3Error(
      'InvalidRange',
      'The requested range is not satisfiable',
      { RangeRequested: header ?? '', ActualObjectSize: String(size) },
      { 'content-range': `bytes */${String(size)}` },
    );
  }
  return { start, end };
}

/** The range of a part copied from another object, `bytes=first-last` inside it. Throws InvalidArgument. */
export function parseCopyRange(header: string | undefined, size: number): ByteRange {
  if (header === undefined) return { start: 0, end: size - 1 };
  const match = /^bytes=(\d+)-(\d+)$/.exec(header);
  const range = { start: Number(match?.[1]), end: Number(match?.[2]) };
  if (!match || range.start > range.end || range.end >= size) {
    throw new S3Error(
      'InvalidArgument',
      `Range specified is not valid for source object of size: ${String(size)}`,
      { ArgumentName: 'x-amz-copy-source-range', ArgumentValue: header },
    );
  }
  return range;
}
