import { createHash, createHmac, timingSafeEqual } from 'node:crypto';
import type { IncomingHttpHeaders } from 'node:http';
import S3Error from 's3rver/lib/models/error.js';

/** How far the two clocks may be apart. */
const skewMs = 15 * 60 * 1000;

type SignedRequest = { method: string; url: string; headers: IncomingHttpHeaders };
type Claim = {
  credential: string;
  signedHeaders: string[];
  signature: string;
  date: string;
  payload: string;
  query: [string, string][];
};

/**
 * Refuses a request whose AWS Signature Version 4 is missing, over or wrong, in the header or in the address.
 * Source: Amazon S3 API Reference, "Authenticating Requests (AWS Signature Version 4)".
 * @throws S3Error
 */
export function checkSignature(request: SignedRequest, secretOf: (accessKeyId: string) => string | undefined) {
  const claim = claimOf(request);
  const [accessKeyId = '', day = '', region = '', service = ''] = claim.credential.split('/');
  const secret = secretOf(accessKeyId);
  if (secret === undefined) throw new S3Error('InvalidAccessKeyId', 'This access key is not known here.');
  if (!claim.signedHeaders.includes('host')) throw new S3Error('AccessDenied', 'The host header must be signed.');
  const unsigned = Object.keys(request.headers).find(
    (name) => name.startsWith('x-amz-') && !claim.signedHeaders.includes(name),
  );
  if (unsigned) throw new S3Error('AccessDenied', `The header ${unsigned} was sent and is not signed.`);

  const scope = [day, region, service, 'aws4_request'].join('/');
  const toSign = ['AWS4-HMAC-SHA256', claim.date, scope, sha256(canonicalRequest(request, claim))].join('\n');
  const key = [day, region, service, 'aws4_request'].reduce<Buffer | string>(hmac, `AWS4${secret}`);
  const expected = hmac(key, toSign);
  const given = Buffer.from(claim.signature, 'hex');
  if (given.length !== expected.length || !timingSafeEqual(given, expected)) {
    throw new S3Error(
      'SignatureDoesNotMatch',
      'The signature does not match the request. Check the key and the method.',
    );
  }
}

function claimOf({ url, headers }: SignedRequest): Claim {
  const { searchParams } = new URL(url, 'http://store');
  const query = [...searchParams];
  const authorization = headers.authorization ?? '';
  if (authorization.startsWith('AWS4-HMAC-SHA256')) {
    const part = (name: string) => authorization.match(new RegExp(`${name}=([^,\\s]+)`))?.[1] ?? '';
    const date = String(headers['x-amz-date'] ?? '');
    if (!(Math.abs(Date.now() - instantOf(date)) <= skewMs)) {
      throw new S3Error('RequestTimeTooSkewed', 'The time of the request and the time here are too far apart.');
    }
    return {
      credential: part('Credential'),
      signedHeaders: part('SignedHeaders').split(';'),
      signature: part('Signature'),
      date,
      payload: String(headers['x-amz-content-sha256'] ?? ''),
      query,
    };
  }
  if (searchParams.has('X-Amz-Signature')) {
    const part = (name: string) => searchParams.get(`X-Amz-${name}`) ?? '';
    const over = instantOf(part('Date')) + Number(part('Expires') || Number.NaN) * 1000;
    if (!(Date.now() <= over)) throw new S3Error('AccessDenied', 'Request has expired');
    return {
      credential: part('Credential'),
      signedHeaders: part('SignedHeaders').split(';'),
      signature: part('Signature'),
      date: part('Date'),
      payload: part('Content-Sha256') || 'UNSIGNED-PAYLOAD',
      query: query.filter(([name]) => name !== 'X-Amz-Signature'),
    };
  }
  throw new S3Error('AccessDenied', 'Access Denied');
}

function canonicalRequest({ method, url, headers }: SignedRequest, claim: Claim) {
  const query = claim.query
    .map(([name, value]) => [encode(name), encode(value)] as const)
    .sort(([a, x], [b, y]) => (a === b ? order(x, y) : order(a, b)))
    .map((pair) => pair.join('='))
    .join('&');
  const signed = claim.signedHeaders.map((name) => {
    const value = String(headers[name] ?? '')
      .trim()
      .replace(/ +/g, ' ');
    return `${name}:${value}`;
  });
  const path = url.split('?', 1)[0];
  return [method, path, query, ...signed, '', claim.signedHeaders.join(';'), claim.payload].join('\n');
}

/** `20260303T060000Z` as milliseconds; NaN where it is no date. */
function instantOf(date: string) {
  return Date.parse(date.replace(/^(\d{4})(\d\d)(\d\dT\d\d)(\d\d)(\d\dZ)$/, '$1-$2-$3:$4:$5'));
}

const order = (a: string, b: string) => (a < b ? -1 : a > b ? 1 : 0);
const hmac = (key: Buffer | string, text: string) => createHmac('sha256', key).update(text).digest();
const sha256 = (text: string) => createHash('sha256').update(text).digest('hex');
const encode = (text: string) =>
  encodeURIComponent(text).replace(/[!'()*]/g, (sign) => `%${sign.charCodeAt(0).toString(16).toUpperCase()}`);
