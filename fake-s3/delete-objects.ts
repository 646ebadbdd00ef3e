import { announcedChecksum } from './checksums.ts';
import { S3Error } from './errors.ts';
import { sendXml, type Exchange } from './exchange.ts';
import { receiveText } from './request-body.ts';
import { element, parseXml, resultDocument } from './xml.ts';

const MAX_KEYS = 1000;

/** DeleteObjects: up to 1000 keys, each reported unless the request is quiet. */
export async function deleteObjects(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage } = exchange;
  const digested =
    request.header('content-md5') ?? request.header('x-amz-trailer') ?? announcedChecksum(request.header);
  if (digested === undefined) {
    throw new S3Error('InvalidRequest', 'Missing required header for this request: Content-MD5');
  }
  const { keys, quiet } = parseDelete(await receiveText(request, authorisation));
  storage.objects.keys(request.bucket);
  for (const key of keys) await storage.objects.remove(request.bucket, key, () => undefined);
  const deleted = quiet ? [] : keys.map((key) => element('Deleted', [element('Key', key)]));
  sendXml(response, 200, resultDocument('DeleteResult', deleted));
}

function parseDelete(body: string): { keys: string[]; quiet: boolean } {
  const { Object: objects, Quiet: quiet } = parseXml(body, 'Delete');
  const malformed = new S3Error(
    'MalformedXML',
    'The XML you provided was not well-formed or did not validate against our published schema',
  );
  if (!Array.isArray(objects) || objects.length > MAX_KEYS) throw malformed;
  const keys = objects.map((object: unknown) => {
    const fields = (typeof object === 'object' && object !== null ? object : {}) as Record<string, unknown>;
    if (typeof fields['Key'] !== 'string' || fields['Key'] === '') throw malformed;
    const unsupported = ['VersionId', 'ETag', 'LastModifiedTime', 'Size'].find((name) => name in fields);
    if (unsupported)
      throw new S3Error('NotImplemented', `${unsupported} in a batch delete is not implemented`);
    return fields['Key'];
  });
  return { keys, quiet: String(quiet).trim() === 'true' };
}
