import { createHash } from 'node:crypto';
import { crc32 } from 'node:zlib';
import S3Error from 's3rver/lib/models/error.js';

type Headers = Record<string, string | string[] | undefined>;

/**
 * Hashes a body as it passes and refuses it where it is not what its headers promised.
 * Source: Amazon S3 API Reference, PutObject and UploadPart: Content-MD5, x-amz-checksum-*, x-amz-content-sha256.
 */
export function checksumsOf(headers: Headers) {
  const header = (name: string) => {
    const value = headers[name];
    return typeof value === 'string' && value !== '' ? value : undefined;
  };
  const promised = {
    md5: header('content-md5'),
    sha256: header('x-amz-checksum-sha256'),
    crc32: header('x-amz-checksum-crc32'),
    // other values of this header are words such as UNSIGNED-PAYLOAD
    payload: header('x-amz-content-sha256')?.match(/^[0-9a-f]{64}$/)?.[0],
  };
  const md5 = createHash('md5');
  const sha256 = promised.sha256 || promised.payload ? createHash('sha256') : undefined;
  let crc = 0;
  let size = 0;

  return {
    update(chunk: Buffer) {
      size += chunk.length;
      md5.update(chunk);
      sha256?.update(chunk);
      if (promised.crc32) crc = crc32(chunk, crc);
    },
    /** @throws S3Error BadDigest or XAmzContentSHA256Mismatch */
    finish(): { md5: string; sha256: string | undefined; size: number } {
      const md5Sum = md5.digest();
      const sha256Sum = sha256?.digest();
      const crcSum = Buffer.alloc(4);
      crcSum.writeUInt32BE(crc >>> 0);
      if (promised.md5 && md5Sum.toString('base64') !== promised.md5) throw mismatch('Content-MD5');
      if (promised.sha256 && sha256Sum?.toString('base64') !== promised.sha256) throw mismatch('SHA256');
      if (promised.crc32 && crcSum.toString('base64') !== promised.crc32) throw mismatch('CRC32');
      if (promised.payload && sha256Sum?.toString('hex') !== promised.payload) {
        const error = new S3Error('XAmzContentSHA256Mismatch', 'The body is not what x-amz-content-sha256 promised.');
        error.status = 400;
        throw error;
      }
      return { md5: md5Sum.toString('hex'), sha256: sha256Sum?.toString('base64'), size };
    },
  };
}

const mismatch = (name: string) =>
  new S3Error('BadDigest', `The ${name} you specified did not match what was received.`);
