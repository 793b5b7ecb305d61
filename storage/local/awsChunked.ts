import { Transform, type TransformCallback } from 'node:stream';

type State = 'size' | 'data' | 'lineEnd' | 'trailer';

/**
 * Takes the frames off an `aws-chunked` body, so that they are never stored as content.
 * Source: Amazon S3 API Reference, "Signature calculations for the Authorization header: transferring payload in
 * multiple chunks": `hex-size;chunk-signature=…\r\n data \r\n`, the last of size 0, then trailers.
 */
export class UnframeChunks extends Transform {
  private held = Buffer.alloc(0);
  private left = 0;
  private state: State = 'size';

  constructor(readonly headers: Record<string, string | string[] | undefined>) {
    super({ highWaterMark: 256 * 1024 });
  }

  override _transform(chunk: Buffer, _encoding: BufferEncoding, done: TransformCallback) {
    let rest = this.held.length > 0 ? Buffer.concat([this.held, chunk]) : chunk;
    while (this.state !== 'trailer') {
      if (this.state === 'size') {
        const lineEnd = rest.indexOf('\r\n');
        if (lineEnd < 0) break;
        this.left = Number.parseInt(rest.subarray(0, lineEnd).toString('latin1'), 16);
        rest = rest.subarray(lineEnd + 2);
        this.state = this.left > 0 ? 'data' : 'trailer';
      } else if (this.state === 'data') {
        const taken = Math.min(this.left, rest.length);
        if (taken > 0) this.push(rest.subarray(0, taken));
        rest = rest.subarray(taken);
        this.left -= taken;
        if (this.left > 0) break;
        this.state = 'lineEnd';
      } else {
        if (rest.length < 2) break;
        rest = rest.subarray(2);
        this.state = 'size';
      }
    }
    this.held = this.state === 'trailer' ? Buffer.alloc(0) : Buffer.from(rest);
    done();
  }
}

export function isChunked(headers: Record<string, string | string[] | undefined>) {
  return (
    String(headers['content-encoding'] ?? '').includes('aws-chunked') ||
    String(headers['x-amz-content-sha256'] ?? '').startsWith('STREAMING-')
  );
}
