import S3Error from 's3rver/lib/models/error.js';

/**
 * The bytes that a Range header asks for, both ends included; undefined where the whole is to be sent.
 * Source: RFC 9110, 14.1.2: `bytes=-500` is the last 500 bytes, `bytes=0-0` the first; several ranges and unknown units
 * may be ignored (14.2).
 * @throws S3Error InvalidRange, answered with 416
 */
export function bytesAsked(range: string | undefined, size: number): { start: number; end: number } | undefined {
  const [, first = '', last = ''] = /^bytes=(\d*)-(\d*)$/.exec(range ?? '') ?? [];
  if (first === '' && last === '') return undefined;
  const start = first === '' ? Math.max(0, size - Number(last)) : Number(first);
  const end = first === '' || last === '' ? size - 1 : Math.min(Number(last), size - 1);
  if (first !== '' && last !== '' && Number(last) < Number(first)) return undefined;
  if (start >= size || start > end) throw new S3Error('InvalidRange', 'The requested range is not satisfiable');
  return { start, end };
}
