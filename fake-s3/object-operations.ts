import { Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { parseRange } from './byte-ranges.ts';
import { checksumHeader } from './checksums.ts';
import { checkReadConditions, rangeStillApplies, writeCondition } from './conditions.ts';
import { sendEmpty, type Exchange } from './exchange.ts';
import { keptHeaders, replyHeaders } from './object-headers.ts';
import { receiveBody, receiveText } from './request-body.ts';

/** Largest body of a single PUT, in bytes: 5 GiB, as in S3. */
export const MAX_PUT_BYTES = 5 * 1024 ** 3;

/** PutObject. */
export async function putObject(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  const { bucket, key } = request;
  const headers = keptHeaders(request);
  const allow = writeCondition(request.header);
  // Asked now to spare a vain upload, and again when it is published.
  allow(storage.objects.find(bucket, key));
  const writer = await storage.data.create();
  try {
    const limits = { maxBytes: MAX_PUT_BYTES, lengthRequired: true };
    const { md5Hex, size, checksum } = await receiveBody(request, authorisation, limits, (bytes) =>
      writer.write(bytes),
    );
    const segments = [await writer.commit()];
    try {
      const record = {
        key,
        size,
        etag: md5Hex,
        modified: now,
        headers,
        segments,
        ...(checksum && { checksum }),
      };
      await storage.objects.publish(bucket, record, allow);
    } catch (error) {
      await storage.data.remove(segments);
      throw error;
    }
    const checksumHeaders = checksum ? { [checksumHeader(checksum.algorithm)]: checksum.value } : {};
    sendEmpty(response, 200, { etag: `"${md5Hex}"`, ...checksumHeaders });
  } finally {
    await writer.discard();
  }
}

/** GetObject and HeadObject: whole or one range, conditions first. */
export async function getObject(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage } = exchange;
  await receiveText(request, authorisation);
  const record = storage.objects.get(request.bucket, request.key);
  const release = storage.data.hold(record.segments);
  try {
    checkReadConditions(request.header, record);
    const headers = replyHeaders(request, record);
    const asked = rangeStillApplies(request.header, record) ? request.header('range') : undefined;
    const range = parseRange(asked, record.size);
    if (range) {
      headers['content-range'] = `bytes ${String(range.start)}-${String(range.end)}/${String(record.size)}`;
      headers['content-length'] = String(range.end - range.start + 1);
      // A checksum of the whole would not match what is sent.
      for (const name of Object.keys(headers)) if (name.startsWith('x-amz-checksum-')) headers[name] = '';
    }
    const sent = Object.fromEntries(Object.entries(headers).filter(([, value]) => value !== ''));
    const status = range ? 206 : 200;
    if (request.method === 'HEAD') {
      sendEmpty(response, status, sent);
      return;
    }
    response.writeHead(status, sent);
    const { start, end } = range ?? { start: 0, end: record.size - 1 };
    await pipeline(
      Readable.from(storage.data.read(record.segments, start, end), { objectMode: false }),
      response,
    );
  } finally {
    await release();
  }
}

/** DeleteObject; If-Match is honoured. */
export async function deleteObject(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage } = exchange;
  await receiveText(request, authorisation);
  const ifMatch = request.header('if-match');
  const allow = writeCondition((name) => (name === 'if-match' ? ifMatch : undefined));
  await storage.objects.remove(request.bucket, request.key, allow);
  sendEmpty(response, 204);
}
