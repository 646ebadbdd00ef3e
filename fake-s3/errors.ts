/** Codes of the S3 API that this server answers, each with its HTTP status. */
const STATUS = {
  AccessDenied: 403,
  AccessForbidden: 403,
  AuthorizationHeaderMalformed: 400,
  AuthorizationQueryParametersError: 400,
  BadDigest: 400,
  BucketAlreadyOwnedByYou: 409,
  BucketNotEmpty: 409,
  EntityTooLarge: 400,
  EntityTooSmall: 400,
  IncompleteBody: 400,
  InternalError: 500,
  InvalidAccessKeyId: 403,
  InvalidArgument: 400,
  InvalidBucketName: 400,
  InvalidChunkSizeError: 400,
  InvalidDigest: 400,
  InvalidPart: 400,
  InvalidPartOrder: 400,
  InvalidRange: 416,
  InvalidRequest: 400,
  InvalidURI: 400,
  KeyTooLongError: 400,
  MalformedTrailerError: 400,
  MalformedXML: 400,
  MetadataTooLarge: 400,
  MethodNotAllowed: 405,
  MissingContentLength: 411,
  MissingSecurityHeader: 400,
  NoSuchBucket: 404,
  NoSuchKey: 404,
  NoSuchUpload: 404,
  NotImplemented: 501,
  NotModified: 304,
  PreconditionFailed: 412,
  RequestTimeTooSkewed: 403,
  SignatureDoesNotMatch: 403,
  XAmzContentSHA256Mismatch: 400,
} as const;

export type S3ErrorCode = keyof typeof STATUS;

/** A refusal in S3's terms: its code decides the status; details become further elements of the body. */
export class S3Error extends Error {
  readonly code: S3ErrorCode;
  readonly status: number;
  readonly details: Readonly<Record<string, string>>;
  readonly headers: Readonly<Record<string, string>>;

  constructor(
    code: S3ErrorCode,
    message: string,
    details: Readonly<Record<string, string>> = {},
    headers: Readonly<Record<string, string>> = {},
  ) {
    super(message);
    this.name = 'S3Error';
    this.code = code;
    this.status = STATUS[code];
    this.details = details;
    this.headers = headers;
  }
}
