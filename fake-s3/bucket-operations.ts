import { S3Error } from './errors.ts';
import { sendEmpty, sendXml, type Exchange } from './exchange.ts';
import { receiveText } from './request-body.ts';
import { element, resultDocument } from './xml.ts';

/** ListBuckets. */
export async function listBuckets({ request, authorisation, response, storage }: Exchange): Promise<void> {
  await receiveText(request, authorisation);
  const buckets = storage.objects
    .listBuckets()
    .map(({ name, created }) => element('Bucket', [element('Name', name), element('CreationDate', created)]));
  sendXml(response, 200, resultDocument('ListAllMyBucketsResult', [element('Buckets', buckets)]));
}

/** CreateBucket; the location constraint of its body is not looked at, since there is one region. */
export async function createBucket(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, now } = exchange;
  await receiveText(request, authorisation);
  await storage.objects.createBucket(request.bucket, now);
  sendEmpty(response, 200, { location: `/${request.bucket}` });
}

/** HeadBucket. */
export async function headBucket({ request, response, storage, region }: Exchange): Promise<void> {
  requireBucket(storage.objects.hasBucket(request.bucket), request.bucket);
  sendEmpty(response, 200, { 'x-amz-bucket-region': region });
  return Promise.resolve();
}

/** DeleteBucket; uploads under way in it are aborted. */
export async function deleteBucket({ request, authorisation, response, storage }: Exchange): Promise<void> {
  await receiveText(request, authorisation);
  await storage.objects.deleteBucket(request.bucket);
  for (const upload of storage.uploads.list(request.bucket)) await storage.uploads.abort(upload);
  sendEmpty(response, 204);
}

/** GetBucketLocation. */
export async function getBucketLocation(exchange: Exchange): Promise<void> {
  const { request, authorisation, response, storage, region } = exchange;
  await receiveText(request, authorisation);
  requireBucket(storage.objects.hasBucket(request.bucket), request.bucket);
  // The oldest region is named by an empty element.
  const location = region === 'us-east-1' ? '' : region;
  const document = resultDocument('LocationConstraint', location === '' ? [] : [{ xml: location }]);
  sendXml(response, 200, document);
}

function requireBucket(exists: boolean, name: string): void {
  if (!exists) throw new S3Error('NoSuchBucket', 'The specified bucket does not exist', { BucketName: name });
}
