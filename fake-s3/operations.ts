import {
  createBucket,
  deleteBucket,
  getBucketLocation,
  headBucket,
  listBuckets,
} from './bucket-operations.ts';
import { copyObject, uploadPartCopy } from './copy-operations.ts';
import { deleteObjects } from './delete-objects.ts';
import { S3Error } from './errors.ts';
import { type Exchange } from './exchange.ts';
import { listMultipartUploads, listObjects, listObjectsV2 } from './list-operations.ts';
import {
  abortMultipartUpload,
  completeMultipartUpload,
  createMultipartUpload,
  listParts,
  uploadPart,
} from './multipart-operations.ts';
import { deleteObject, getObject, putObject } from './object-operations.ts';
import { type S3Request } from './s3-request.ts';

type Operation = (exchange: Exchange) => Promise<void>;

type Rule = {
  readonly on: 'service' | 'bucket' | 'object';
  readonly method: string;
  /** A query parameter that must be there. */
  readonly param?: string;
  /** A header that must be there. */
  readonly header?: string;
  readonly run: Operation;
};

/** What each kind of request means; the first rule that fits is taken. */
const RULES: readonly Rule[] = [
  { on: 'service', method: 'GET', run: listBuckets },
  { on: 'bucket', method: 'GET', param: 'location', run: getBucketLocation },
  { on: 'bucket', method: 'GET', param: 'uploads', run: listMultipartUploads },
  { on: 'bucket', method: 'GET', param: 'list-type', run: listObjectsV2 },
  { on: 'bucket', method: 'GET', run: listObjects },
  { on: 'bucket', method: 'POST', param: 'delete', run: deleteObjects },
  { on: 'bucket', method: 'PUT', run: createBucket },
  { on: 'bucket', method: 'HEAD', run: headBucket },
  { on: 'bucket', method: 'DELETE', run: deleteBucket },
  { on: 'object', method: 'POST', param: 'uploads', run: createMultipartUpload },
  { on: 'object', method: 'POST', param: 'uploadId', run: completeMultipartUpload },
  { on: 'object', method: 'PUT', param: 'uploadId', header: 'x-amz-copy-source', run: uploadPartCopy },
  { on: 'object', method: 'PUT', param: 'uploadId', run: uploadPart },
  { on: 'object', method: 'GET', param: 'uploadId', run: listParts },
  { on: 'object', method: 'DELETE', param: 'uploadId', run: abortMultipartUpload },
  { on: 'object', method: 'PUT', header: 'x-amz-copy-source', run: copyObject },
  { on: 'object', method: 'PUT', run: putObject },
  { on: 'object', method: 'GET', run: getObject },
  { on: 'object', method: 'HEAD', run: getObject },
  { on: 'object', method: 'DELETE', run: deleteObject },
];

/** Parameters that turn a request into one of S3's features that are missing here. */
const UNSUPPORTED_PARAMS = new Set(
  `accelerate acl analytics attributes cors encryption intelligent-tiering inventory legal-hold lifecycle logging
   metrics notification object-lock ownershipControls policy policyStatus publicAccessBlock replication requestPayment
   restore retention select tagging torrent versionId versioning versions website`.split(/\s+/),
);

/** The operation that a request asks for. Throws NotImplemented or MethodNotAllowed. */
export function chooseOperation(request: S3Request): Operation {
  const on = request.key !== '' ? 'object' : request.bucket !== '' ? 'bucket' : 'service';
  const { method } = request;
  const unsupported = request.query.find(([name]) => UNSUPPORTED_PARAMS.has(name))?.[0];
  const rule = RULES.find(
    (candidate) =>
      candidate.on === on &&
      candidate.method === method &&
      (candidate.param === undefined || request.param(candidate.param) !== undefined) &&
      (candidate.header === undefined || request.header(candidate.header) !== undefined),
  );
  const partOfObject =
    on === 'object' && request.param('partNumber') !== undefined && rule?.param === undefined;
  if (unsupported !== undefined || partOfObject) {
    throw new S3Error(
      'NotImplemented',
      'A parameter you provided implies functionality that is not implemented',
      { Parameter: unsupported ?? 'partNumber' },
    );
  }
  if (!rule) {
    throw new S3Error('MethodNotAllowed', 'The specified method is not allowed against this resource.', {
      Method: method,
      ResourceType: on.toUpperCase(),
    });
  }
  return rule.run;
}
