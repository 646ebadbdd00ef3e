import { S3Error } from './errors.ts';
import { type ObjectRecord } from './object-store.ts';

type Header = (name: string) => string | undefined;

/**
 * Applies If-Match, If-Unmodified-Since, If-None-Match, If-Modified-Since to a read, in the order of
 * RFC 9110 section 13.2.2. Throws PreconditionFailed or NotModified.
 */
export function checkReadConditions(header: Header, record: ObjectRecord): void {
  const outcome = readOutcome(header, record, '');
  if (outcome === 'failed') throw preconditionFailed();
  if (outcome === 'unchanged') {
    throw new S3Error(
      'NotModified',
      'Not modified',
      {},
      {
        etag: `"${record.etag}"`,
        'last-modified': httpDate(record.modified),
      },
    );
  }
}

/** Applies the x-amz-copy-source-if-* headers to the source of a copy. Throws PreconditionFailed. */
export function checkCopyConditions(header: Header, source: ObjectRecord): void {
  if (readOutcome(header, source, 'x-amz-copy-source-') !== 'met') throw preconditionFailed();
}

/**
 * The check that a write's If-None-Match: * and If-Match ask of the object it would replace. It throws
 * PreconditionFailed, or NoSuchKey when If-Match meets nothing. Throws NotImplemented for forms S3 lacks.
 */
export function writeCondition(header: Header): (current: ObjectRecord | undefined) => void {
  const ifNoneMatch = header('if-none-match');
  const ifMatch = header('if-match');
  if (ifNoneMatch !== undefined && ifNoneMatch !== '*') {
    throw new S3Error(
      'NotImplemented',
      'A header you provided implies functionality that is not implemented',
      {
        Header: 'If-None-Match',
      },
    );
  }
  return (current) => {
    if (ifNoneMatch !== undefined && current) throw preconditionFailed('If-None-Match');
    if (ifMatch === undefined) return;
    if (!current) throw new S3Error('NoSuchKey', 'The specified key does not exist.');
    if (!matches(ifMatch, current.etag)) throw preconditionFailed('If-Match');
  };
}

/** Whether a Range header counts, given If-Range: only while the object is still the one it names. */
export function rangeStillApplies(header: Header, record: ObjectRecord): boolean {
  const ifRange = header('if-range');
  if (ifRange === undefined) return true;
  const date = seconds(ifRange);
  return matches(ifRange, record.etag) || (date !== undefined && date === seconds(record.modified));
}

/** A date in the form of HTTP headers, of one in ISO 8601. */
export function httpDate(iso: string): string {
  return new Date(iso).toUTCString();
}

function readOutcome(header: Header, record: ObjectRecord, prefix: string): 'met' | 'failed' | 'unchanged' {
  const ifMatch = header(`${prefix}if-match`);
  const ifNoneMatch = header(`${prefix}if-none-match`);
  const unmodifiedSince = seconds(header(`${prefix}if-unmodified-since`));
  const modifiedSince = seconds(header(`${prefix}if-modified-since`));
  const modified = seconds(record.modified) ?? 0;
  if (ifMatch !== undefined) {
    if (!matches(ifMatch, record.etag)) return 'failed';
  } else if (unmodifiedSince !== undefined && modified > unmodifiedSince) return 'failed';
  if (ifNoneMatch !== undefined) return matches(ifNoneMatch, record.etag) ? 'unchanged' : 'met';
  return modifiedSince !== undefined && modified <= modifiedSince ? 'unchanged' : 'met';
}

function matches(list: string, etag: string): boolean {
  return list.split(',').some((item) => {
    const tag = item
      .trim()
      .replace(/^W\//, '')
      .replace(/^"(.*)"$/, '$1');
    return tag === '*' || tag === etag;
  });
}

/** Whole seconds of a date, the precision of HTTP; undefined when it is none. */
function seconds(date: string | undefined): number | undefined {
  const time = date === undefined ? NaN : Date.parse(date);
  return Number.isNaN(time) ? undefined : Math.floor(time / 1000);
}

function preconditionFailed(condition?: string): S3Error {
  return new S3Error(
    'PreconditionFailed',
    'At least one of the pre-conditions you specified did not hold',
    condition === undefined ? {} : { Condition: condition },
  );
}
