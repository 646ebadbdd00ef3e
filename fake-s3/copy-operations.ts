import { createHash } from 'node:crypto';
import { type ByteRange, parseCopyRange } from './byte-ranges.ts';
import { type Checksum, checksumElement, startChecksum } from './checksums.ts';
import { checkCopyConditions, writeCondition } from './conditions.ts';
import { type Segment } from './data-files.ts';
import { S3Error } from './errors.ts';
import { sendXml, type Exchange } from './exchange.ts';
import { partNumberOf, uploadOf } from './multipart-operations.ts';
import { keptHeaders } from './object-headers.ts';
import { MAX_PUT_BYTES } from './object-operations.ts';
import { type ObjectRecord } from './object-store.ts';
import { receiveText } from './request-body.ts';
import { type Storage } from './storage.ts';
import { element, resultDocument, type Xml } from './xml.ts';

/** CopyObject: the bytes get a second name, so a large object is copied at once. */
export async function copyObject(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  await receiveText(request, authorisation);
  const { bucket, key } = request;
  const source = findSource(exchange);
  const replace = (request.header('x-amz-metadata-directive') ?? 'COPY').toUpperCase() === 'REPLACE';
  if (source.bucket === bucket && source.record.key === key && !replace) {
    throw new S3Error(
      'InvalidRequest',
      "This copy request is illegal because it is trying to copy an object to itself without changing the object's metadata.",
    );
  }
  const given = keptHeaders(request);
  const allow = writeCondition(request.header);
  const release = storage.data.hold(source.record.segments);
  try {
    const { size, checksum } = source.record;
    const etag = await plainEtag(storage, source.record);
    const headers = replace ? given : source.record.headers;
    const segments = await storage.data.duplicate(source.record.segments);
    const record = { key, size, etag, modified: now, headers, segments, ...(checksum && { checksum }) };
    try {
      await storage.objects.publish(bucket, record, allow);
    } catch (error) {
      await storage.data.remove(segments);
      throw error;
    }
    sendXml(response, 200, resultDocument('CopyObjectResult', copyResult(now, etag, checksum)));
  } finally {
    await release();
  }
}

/** UploadPartCopy: a part whose bytes are another object's, or a range of them. */
export async function uploadPartCopy(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  await receiveText(request, authorisation);
  const upload = uploadOf(exchange);
  const number = partNumberOf(request);
  const { record } = findSource(exchange);
  const range = parseCopyRange(request.header('x-amz-copy-source-range'), record.size);
  if (range.end - range.start + 1 > MAX_PUT_BYTES) {
    throw new S3Error('EntityTooLarge', 'The specified copy source is larger than the maximum allowed size');
  }
  const release = storage.data.hold(record.segments);
  try {
    const copied = await copyRange(storage, record, range, upload.algorithm);
    const { etag, checksum, segment } = copied;
    const part = { number, etag, modified: now, segment, ...(checksum && { checksum }) };
    try {
      await storage.uploads.putPart(upload, part);
    } catch (error) {
      await storage.data.remove([segment]);
      throw error;
    }
    sendXml(response, 200, resultDocument('CopyPartResult', copyResult(now, etag, checksum)));
  } finally {
    await release();
  }
}

/** The object that x-amz-copy-source names, its conditions met. */
function findSource({ request, storage }: Exchange): { bucket: string; record: ObjectRecord } {
  const header = request.header('x-amz-copy-source') ?? '';
  const match = /^\/?([^/?]+)\/([^?]+)$/.exec(header);
  if (!match?.[1] || !match[2]) {
    throw new S3Error(
      'InvalidArgument',
      'Copy Source must mention the source bucket and key: sourcebucket/sourcekey',
    );
  }
  let key: string;
  try {
    key = decodeURIComponent(match[2]);
  } catch {
    throw new S3Error('InvalidArgument', 'Invalid copy source encoding.');
  }
  const record = storage.objects.get(match[1], key);
  checkCopyConditions(request.header, record);
  return { bucket: match[1], record };
}

/** The MD5 of an object's bytes. One made of parts has to be read for it, since a copy is one piece. */
async function plainEtag(storage: Storage, record: ObjectRecord): Promise<string> {
  if (!record.etag.includes('-')) return record.etag;
  const md5 = createHash('md5');
  for await (const bytes of storage.data.read(record.segments, 0, record.size - 1)) md5.update(bytes);
  return md5.digest('hex');
}

async function copyRange(
  storage: Storage,
  source: ObjectRecord,
  range: ByteRange,
  algorithm: Checksum['algorithm'] | undefined,
): Promise<{ etag: string; segment: Segment; checksum?: Checksum }> {
  const writer = await storage.data.create();
  try {
    const md5 = createHash('md5');
    const running = algorithm && startChecksum(algorithm);
    for await (const bytes of storage.data.read(source.segments, range.start, range.end)) {
      md5.update(bytes);
      running?.update(bytes);
      await writer.write(bytes);
    }
    const checksum = running && { algorithm, value: running.digest().toString('base64') };
    const segment = await writer.commit();
    return { etag: md5.digest('hex'), segment, ...(checksum && { checksum }) };
  } finally {
    await writer.discard();
  }
}

function copyResult(modified: string, etag: string, checksum: Checksum | undefined): Xml[] {
  return [
    element('LastModified', modified),
    element('ETag', `"${etag}"`),
    ...(checksum ? [element(checksumElement(checksum.algorithm), checksum.value)] : []),
  ];
}
