import {
  canonicalRequest,
  sameSignature,
  scopeText,
  sign,
  signingKey,
  stringToSign,
  type CredentialScope,
} from './canonical-request.ts';
import { S3Error } from './errors.ts';
import { headerText, type S3Request } from './s3-request.ts';

/** The one account that this server knows. */
export type Account = {
  readonly region: string;
  readonly accessKeyId: string;
  readonly secretAccessKey: string;
};

/** What a verified signature says of the body, and what the signatures of its chunks continue from. */
export type Authorisation = {
  /** The value of x-amz-content-sha256: a hex hash, UNSIGNED-PAYLOAD or one of the STREAMING-… forms. */
  readonly payloadHash: string;
  readonly timestamp: string;
  readonly scope: string;
  readonly signature: string;
  readonly signingKey: Buffer;
};

type Claim = {
  readonly credential: string;
  readonly signedHeaders: readonly string[];
  readonly signature: string;
  readonly timestamp: string;
  readonly payloadHash: string;
  readonly malformed: 'AuthorizationHeaderMalformed' | 'AuthorizationQueryParametersError';
  /** Seconds that a presigned address is good for; undefined for a signed header. */
  readonly expires?: number;
};

const MAX_SKEW_MS = 15 * 60 * 1000;
const MAX_EXPIRES_S = 604_800;
const ALGORITHM = 'AWS4-HMAC-SHA256';

/**
 * Verifies a request's Signature Version 4, in the Authorization header or in a presigned address, against
 * the account and the clock. Throws the S3Error that S3 gives for each way of being wrong. The body is not
 * read here: `payloadHash` is still to be checked against it.
 */
export function verifySignature(request: S3Request, account: Account, now: Date): Authorisation {
  const claim = readClaim(request);
  const scope = checkCredential(claim, account);
  checkTime(claim, now);
  checkSignedHeaders(request, claim.signedHeaders);
  const canonical = canonicalRequest(request, claim.signedHeaders, claim.payloadHash);
  const toSign = stringToSign(canonical, claim.timestamp, scope);
  const key = signingKey(account.secretAccessKey, scope);
  if (!sameSignature(sign(key, toSign), claim.signature)) {
    throw new S3Error(
      'SignatureDoesNotMatch',
      'The request signature we calculated does not match the signature you provided. Check your key and signing method.',
      { StringToSign: toSign, SignatureProvided: claim.signature, CanonicalRequest: canonical },
    );
  }
  return {
    payloadHash: claim.payloadHash,
    timestamp: claim.timestamp,
    scope: scopeText(scope),
    signature: claim.signature,
    signingKey: key,
  };
}

function readClaim(request: S3Request): Claim {
  const authorization = headerText(request.incoming, 'authorization');
  if (request.presigned && authorization !== undefined) {
    throw new S3Error(
      'InvalidArgument',
      'Only one auth mechanism allowed; only the X-Amz-Algorithm query parameter or the Authorization header should be specified',
    );
  }
  if (request.presigned) return readPresignedClaim(request);
  if (authorization !== undefined) return readHeaderClaim(request, authorization);
  throw new S3Error('AccessDenied', 'Access Denied');
}

function readHeaderClaim(request: S3Request, authorization: string): Claim {
  const malformed = 'AuthorizationHeaderMalformed';
  const [algorithm, ...rest] = authorization.split(' ');
  const fields = new Map(
    rest
      .join('')
      .split(',')
      .map((field) => [field.slice(0, field.indexOf('=')), field.slice(field.indexOf('=') + 1)] as const),
  );
  const [credential, signedHeaders, signature] = ['Credential', 'SignedHeaders', 'Signature'].map((name) =>
    fields.get(name),
  );
  if (algorithm !== ALGORITHM || !credential || !signedHeaders || !signature) {
    throw new S3Error(malformed, 'The authorization header that you provided is not valid.');
  }
  const payloadHash = request.header('x-amz-content-sha256');
  if (payloadHash === undefined) {
    throw new S3Error('InvalidRequest', 'Missing required header for this request: x-amz-content-sha256');
  }
  const timestamp = request.header('x-amz-date') ?? timestampOf(request.header('date'));
  return {
    credential,
    signedHeaders: signedHeaders.split(';'),
    signature,
    timestamp,
    payloadHash,
    malformed,
  };
}

/** The Date header in the form that is signed when there is no x-amz-date; empty when it is no date. */
function timestampOf(date: string | undefined): string {
  const parsed = new Date(date ?? '');
  return Number.isNaN(parsed.getTime()) ? '' : parsed.toISOString().replace(/[-:]|\.\d+/g, '');
}

function readPresignedClaim(request: S3Request): Claim {
  const malformed = 'AuthorizationQueryParametersError';
  const field = (name: string): string => {
    const value = request.param(name);
    if (!value) {
      throw new S3Error(
        malformed,
        'Query-string authentication version 4 requires the X-Amz-Algorithm, X-Amz-Credential, X-Amz-Signature, X-Amz-Date, X-Amz-SignedHeaders, and X-Amz-Expires parameters.',
      );
    }
    return value;
  };
  if (field('X-Amz-Algorithm') !== ALGORITHM) {
    throw new S3Error(malformed, `X-Amz-Algorithm only supports "${ALGORITHM}"`);
  }
  const expires = Number(field('X-Amz-Expires'));
  if (!Number.isInteger(expires) || expires < 1 || expires > MAX_EXPIRES_S) {
    throw new S3Error(malformed, `X-Amz-Expires must be a number from 1 to ${String(MAX_EXPIRES_S)}`);
  }
  return {
    credential: field('X-Amz-Credential'),
    signedHeaders: field('X-Amz-SignedHeaders').split(';'),
    signature: field('X-Amz-Signature'),
    timestamp: field('X-Amz-Date'),
    payloadHash: request.header('x-amz-content-sha256') ?? 'UNSIGNED-PAYLOAD',
    malformed,
    expires,
  };
}

function checkCredential(claim: Claim, account: Account): CredentialScope {
  const [accessKeyId, day, region, service, terminator, ...more] = claim.credential.split('/');
  if (!day || !region || service !== 's3' || terminator !== 'aws4_request' || more.length > 0) {
    throw new S3Error(
      claim.malformed,
      'Error parsing the Credential; it should be "<YOUR-AKID>/YYYYMMDD/REGION/s3/aws4_request".',
    );
  }
  if (accessKeyId !== account.accessKeyId) {
    throw new S3Error(
      'InvalidAccessKeyId',
      'The AWS Access Key Id you provided does not exist in our records.',
      {
        AWSAccessKeyId: accessKeyId ?? '',
      },
    );
  }
  if (region !== account.region) {
    throw new S3Error(claim.malformed, `the region '${region}' is wrong; expecting '${account.region}'`, {
      Region: account.region,
    });
  }
  if (day !== claim.timestamp.slice(0, 8)) {
    throw new S3Error(
      claim.malformed,
      `Invalid credential date "${day}". This date is not the same as X-Amz-Date.`,
    );
  }
  return { day, region };
}

function checkTime(claim: Claim, now: Date): void {
  const match = /^(\d{4})(\d\d)(\d\d)T(\d\d)(\d\d)(\d\d)Z$/.exec(claim.timestamp);
  const signedAt = match
    ? Date.parse(claim.timestamp.replace(/(.{4})(..)(..T..)(..)(..Z)/, '$1-$2-$3:$4:$5'))
    : NaN;
  if (Number.isNaN(signedAt)) {
    throw new S3Error('AccessDenied', 'AWS authentication requires a valid Date or x-amz-date header');
  }
  const details = { RequestTime: claim.timestamp, ServerTime: now.toISOString() };
  if (claim.expires === undefined) {
    if (Math.abs(now.getTime() - signedAt) > MAX_SKEW_MS) {
      throw new S3Error(
        'RequestTimeTooSkewed',
        'The difference between the request time and the current time is too large.',
        { ...details, MaxAllowedSkewMilliseconds: String(MAX_SKEW_MS) },
      );
    }
    return;
  }
  if (signedAt - now.getTime() > MAX_SKEW_MS) {
    throw new S3Error('AccessDenied', 'Request is not valid yet', details);
  }
  const expiresAt = signedAt + claim.expires * 1000;
  if (now.getTime() > expiresAt) {
    throw new S3Error('AccessDenied', 'Request has expired', {
      'X-Amz-Expires': String(claim.expires),
      Expires: new Date(expiresAt).toISOString(),
      ServerTime: now.toISOString(),
    });
  }
}

/** `host` and every x-amz-* header must be signed, or someone in between could add to the request. */
function checkSignedHeaders(request: S3Request, signedHeaders: readonly string[]): void {
  const unsigned = Object.keys(request.incoming.headersDistinct).filter(
    (name) => (name === 'host' || name.startsWith('x-amz-')) && !signedHeaders.includes(name),
  );
  if (unsigned.length > 0) {
    throw new S3Error('AccessDenied', 'There were headers present in the request which were not signed', {
      HeadersNotSigned: unsigned.join(', '),
    });
  }
}
