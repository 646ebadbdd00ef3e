import { S3Error } from './errors.ts';
import { countParam, sendXml, type Exchange } from './exchange.ts';
import { compareUtf8, type ListingEntry, type ListingQuery, listKeys } from './listing.ts';
import { receiveText } from './request-body.ts';
import { encodeRfc3986, type S3Request } from './s3-request.ts';
import { element, optionalElement, resultDocument, type Xml } from './xml.ts';

/** ListObjectsV2. */
export function listObjectsV2(exchange: Exchange): Promise<void> {
  const { request } = exchange;
  const token = request.param('continuation-token');
  const startAfter = request.param('start-after');
  const from = token === undefined ? { after: startAfter ?? '', afterIsPrefix: false } : readToken(token);
  return sendListing(exchange, from, ({ encode, last, entries }) => [
    ...optionalElement('StartAfter', startAfter === undefined ? undefined : encode(startAfter)),
    ...optionalElement('ContinuationToken', token),
    ...optionalElement('NextContinuationToken', last && writeToken(last)),
    element('KeyCount', entries.length),
  ]);
}

/** ListObjects, the older form, which some clients still ask by: its pages go on after a key instead of a token. */
export function listObjects(exchange: Exchange): Promise<void> {
  const marker = exchange.request.param('marker') ?? '';
  const delimiter = exchange.request.param('delimiter') ?? '';
  const from = { after: marker, afterIsPrefix: delimiter !== '' && marker.endsWith(delimiter) };
  return sendListing(exchange, from, ({ encode, last }) => {
    const next = last && ('key' in last ? last.key : last.commonPrefix);
    // S3 says where to go on only for grouped keys; without a delimiter it is the last key listed.
    return [
      element('Marker', encode(marker)),
      ...optionalElement('NextMarker', delimiter === '' || next === undefined ? undefined : encode(next)),
    ];
  });
}

type Page = {
  readonly encode: (key: string) => string;
  readonly entries: readonly ListingEntry[];
  /** The entry to go on after; undefined when there are no more. */
  readonly last: ListingEntry | undefined;
};

async function sendListing(
  { request, authorisation, response, storage }: Exchange,
  from: Pick<ListingQuery, 'after' | 'afterIsPrefix'>,
  paging: (page: Page) => Xml[],
): Promise<void> {
  await receiveText(request, authorisation);
  const encode = keyEncoding(request);
  const prefix = request.param('prefix') ?? '';
  const delimiter = request.param('delimiter') ?? '';
  const max = countParam(request, 'max-keys', 1000);
  const keys = storage.objects.keys(request.bucket);
  const { entries, truncated } = listKeys(keys, { prefix, delimiter, max, ...from });
  const contents = entries.flatMap((entry) => {
    const record = 'key' in entry ? storage.objects.find(request.bucket, entry.key) : undefined;
    if (!record) return [];
    return element('Contents', [
      element('Key', encode(record.key)),
      element('LastModified', record.modified),
      element('ETag', `"${record.etag}"`),
      element('Size', record.size),
      element('StorageClass', 'STANDARD'),
    ]);
  });
  const commonPrefixes = entries.flatMap((entry) =>
    'commonPrefix' in entry ? element('CommonPrefixes', [element('Prefix', encode(entry.commonPrefix))]) : [],
  );
  sendXml(
    response,
    200,
    resultDocument('ListBucketResult', [
      element('Name', request.bucket),
      element('Prefix', encode(prefix)),
      ...optionalElement('Delimiter', delimiter === '' ? undefined : encode(delimiter)),
      ...optionalElement('EncodingType', request.param('encoding-type')),
      ...paging({ encode, entries, last: truncated ? entries.at(-1) : undefined }),
      element('MaxKeys', max),
      element('IsTruncated', truncated),
      ...contents,
      ...commonPrefixes,
    ]),
  );
}

/** ListMultipartUploads, in pages by key and upload; a delimiter is refused as not implemented. */
export async function listMultipartUploads(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage } = exchange;
  await receiveText(request, authorisation);
  storage.objects.keys(request.bucket);
  if (request.param('delimiter')) {
    throw new S3Error('NotImplemented', 'A delimiter in the list of uploads is not implemented');
  }
  const encode = keyEncoding(request);
  const prefix = request.param('prefix') ?? '';
  const keyMarker = request.param('key-marker') ?? '';
  const idMarker = keyMarker === '' ? '' : (request.param('upload-id-marker') ?? '');
  const max = countParam(request, 'max-uploads', 1000);
  const all = storage.uploads.list(request.bucket).filter(({ key }) => key.startsWith(prefix));
  const marked = all.findIndex(({ key, uploadId }) => key === keyMarker && uploadId === idMarker);
  const following =
    marked >= 0 ? all.slice(marked + 1) : all.filter(({ key }) => compareUtf8(key, keyMarker) > 0);
  const page = following.slice(0, max);
  const truncated = following.length > page.length;
  const last = truncated ? page.at(-1) : undefined;
  sendXml(
    response,
    200,
    resultDocument('ListMultipartUploadsResult', [
      element('Bucket', request.bucket),
      element('KeyMarker', encode(keyMarker)),
      element('UploadIdMarker', idMarker),
      ...optionalElement('NextKeyMarker', last && encode(last.key)),
      ...optionalElement('NextUploadIdMarker', last?.uploadId),
      element('Prefix', encode(prefix)),
      ...optionalElement('EncodingType', request.param('encoding-type')),
      element('MaxUploads', max),
      element('IsTruncated', truncated),
      ...page.map(({ key, uploadId, initiated }) =>
        element('Upload', [
          element('Key', encode(key)),
          element('UploadId', uploadId),
          element('StorageClass', 'STANDARD'),
          element('Initiated', initiated),
        ]),
      ),
    ]),
  );
}

/** How keys are written in a listing: as they are, or percent-encoded for encoding-type=url. */
function keyEncoding(request: S3Request): (key: string) => string {
  const type = request.param('encoding-type');
  if (type === undefined) return (key) => key;
  if (type === 'url') return (key) => key.split('/').map(encodeRfc3986).join('/');
  throw new S3Error('InvalidArgument', 'Invalid Encoding Method specified in Request', {
    ArgumentName: 'encoding-type',
    ArgumentValue: type,
  });
}

function writeToken(last: ListingEntry): string {
  const text = 'key' in last ? `k${last.key}` : `p${last.commonPrefix}`;
  return Buffer.from(text).toString('base64url');
}

function readToken(token: string): { after: string; afterIsPrefix: boolean } {
  const text = Buffer.from(token, 'base64url').toString('utf8');
  if (!/^[kp]/.test(text)) {
    throw new S3Error('InvalidArgument', 'The continuation token provided is incorrect', {
      ArgumentName: 'continuation-token',
    });
  }
  return { after: text.slice(1), afterIsPrefix: text.startsWith('p') };
}
