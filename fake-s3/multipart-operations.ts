import { checksumElement, checksumHeader, isComposable, parseAlgorithm } from './checksums.ts';
import { writeCondition } from './conditions.ts';
import { S3Error } from './errors.ts';
import { countParam, sendEmpty, sendXml, type Exchange } from './exchange.ts';
import { type UploadRecord } from './multipart-store.ts';
import { keptHeaders } from './object-headers.ts';
import { MAX_PUT_BYTES } from './object-operations.ts';
import { type ObjectRecord } from './object-store.ts';
import { parsePartList } from './part-list.ts';
import { receiveBody, receiveText } from './request-body.ts';
import { type S3Request } from './s3-request.ts';
import { element, optionalElement, resultDocument } from './xml.ts';

const MAX_PART_NUMBER = 10_000;

/** CreateMultipartUpload. */
export async function createMultipartUpload(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  await receiveText(request, authorisation);
  const { bucket, key } = request;
  storage.objects.find(bucket, key);
  const named = request.header('x-amz-checksum-algorithm');
  const algorithm = named === undefined ? undefined : parseAlgorithm(named);
  const type = request.header('x-amz-checksum-type') ?? 'COMPOSITE';
  if (algorithm && (!isComposable(algorithm) || type.toUpperCase() !== 'COMPOSITE')) {
    throw new S3Error('NotImplemented', 'Full object checksums of multipart uploads are not implemented');
  }
  const headers = keptHeaders(request);
  const upload = { bucket, key, initiated: now, headers, ...(algorithm && { algorithm }) };
  const { uploadId } = await storage.uploads.create(upload);
  sendXml(
    response,
    200,
    resultDocument('InitiateMultipartUploadResult', [
      element('Bucket', bucket),
      element('Key', key),
      element('UploadId', uploadId),
    ]),
  );
}

/** UploadPart. */
export async function uploadPart(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  const upload = uploadOf(exchange);
  const number = partNumberOf(request);
  const writer = await storage.data.create();
  try {
    const limits = { maxBytes: MAX_PUT_BYTES, lengthRequired: true, algorithm: upload.algorithm };
    const { md5Hex, checksum } = await receiveBody(request, authorisation, limits, (bytes) =>
      writer.write(bytes),
    );
    const segment = await writer.commit();
    try {
      const part = { number, etag: md5Hex, modified: now, segment, ...(checksum && { checksum }) };
      await storage.uploads.putPart(upload, part);
    } catch (error) {
      await storage.data.remove([segment]);
      throw error;
    }
    const checksumHeaders = checksum ? { [checksumHeader(checksum.algorithm)]: checksum.value } : {};
    sendEmpty(response, 200, { etag: `"${md5Hex}"`, ...checksumHeaders });
  } finally {
    await writer.discard();
  }
}

/** CompleteMultipartUpload. Asked again for an upload that it completed, it answers alike. */
export async function completeMultipartUpload(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  const body = await receiveText(request, authorisation);
  const current = storage.objects.find(request.bucket, request.key);
  if (current?.uploadId !== undefined && current.uploadId === request.param('uploadId')) {
    sendXml(response, 200, completionDocument(request, current));
    return;
  }
  const upload = uploadOf(exchange);
  const record = await storage.uploads.complete(
    upload,
    parsePartList(body),
    now,
    writeCondition(request.header),
  );
  sendXml(response, 200, completionDocument(request, record));
}

/** AbortMultipartUpload. */
export async function abortMultipartUpload(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage } = exchange;
  await receiveText(request, authorisation);
  await storage.uploads.abort(uploadOf(exchange));
  sendEmpty(response, 204);
}

/** ListParts, in pages by part number. */
export async function listParts(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage } = exchange;
  await receiveText(request, authorisation);
  const { uploadId, bucket, key, algorithm } = uploadOf(exchange);
  const marker =
    request.param('part-number-marker') === undefined
      ? 0
      : countParam(request, 'part-number-marker', MAX_PART_NUMBER);
  const max = countParam(request, 'max-parts', 1000);
  const following = storage.uploads.parts(bucket, key, uploadId).filter(({ number }) => number > marker);
  const page = following.slice(0, max);
  sendXml(
    response,
    200,
    resultDocument('ListPartsResult', [
      element('Bucket', bucket),
      element('Key', key),
      element('UploadId', uploadId),
      element('PartNumberMarker', marker),
      ...optionalElement('NextPartNumberMarker', page.at(-1)?.number),
      element('MaxParts', max),
      element('IsTruncated', following.length > page.length),
      ...optionalElement('ChecksumAlgorithm', algorithm?.toUpperCase()),
      ...page.map(({ number, modified, etag, segment, checksum }) =>
        element('Part', [
          element('PartNumber', number),
          element('LastModified', modified),
          element('ETag', `"${etag}"`),
          element('Size', segment.size),
          ...(checksum ? [element(checksumElement(checksum.algorithm), checksum.value)] : []),
        ]),
      ),
    ]),
  );
}

/** The upload that a request is about. Throws NoSuchBucket, NoSuchUpload. */
export function uploadOf({ request, storage }: Exchange): UploadRecord {
  storage.objects.find(request.bucket, request.key);
  return storage.uploads.get(request.bucket, request.key, request.param('uploadId') ?? '');
}

/** The part number that a request names. Throws InvalidArgument outside 1 to 10 000. */
export function partNumberOf(request: S3Request): number {
  const text = request.param('partNumber') ?? '';
  const number = /^\d{1,5}$/.test(text) ? Number(text) : 0;
  if (number >= 1 && number <= MAX_PART_NUMBER) return number;
  throw new S3Error('InvalidArgument', 'Part number must be an integer between 1 and 10000, inclusive', {
    ArgumentName: 'partNumber',
    ArgumentValue: text,
  });
}

function completionDocument(request: S3Request, { etag, checksum }: ObjectRecord): string {
  const { bucket, key } = request;
  return resultDocument('CompleteMultipartUploadResult', [
    element(
      'Location',
      `http://${request.header('host') ?? ''}/${bucket}/${key.split('/').map(encodeURIComponent).join('/')}`,
    ),
    element('Bucket', bucket),
    element('Key', key),
    element('ETag', `"${etag}"`),
    ...(checksum
      ? [element(checksumElement(checksum.algorithm), checksum.value), element('ChecksumType', 'COMPOSITE')]
      : []),
  ]);
}
