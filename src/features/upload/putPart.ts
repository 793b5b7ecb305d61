/** A part that did not reach the store, or that it refused; `status` is 0 without an answer. */
export class LostPart extends Error {
  constructor(
    readonly status: number,
    message: string,
  ) {
    super(message);
    this.name = 'LostPart';
  }
}

/** A connection over which nothing moved for so long is given up, and another one tried. */
const stalledMs = 45_000;

type Target = { url: string; headers: Record<string, string> };

/**
 * Puts a part's bytes into the store; the browser reads them from the disk as it sends them.
 * @param onProgress bytes sent so far
 * @returns the store's ETag
 * @throws LostPart, or the signal's reason
 */
export function putPart(
  { url, headers }: Target,
  bytes: Blob,
  signal: AbortSignal,
  onProgress: (sent: number) => void,
): Promise<string> {
  return new Promise((resolve, reject) => {
    signal.throwIfAborted();
    // fetch tells nothing of what was sent so far
    const request = new XMLHttpRequest();
    let stall: ReturnType<typeof setTimeout>;
    const watch = () => {
      clearTimeout(stall);
      stall = setTimeout(() => request.abort(), stalledMs);
    };
    const stop = () => request.abort();
    const end = (error: unknown) => {
      clearTimeout(stall);
      signal.removeEventListener('abort', stop);
      if (error !== null) reject(error);
    };
    request.open('PUT', url);
    for (const [name, value] of Object.entries(headers)) request.setRequestHeader(name, value);
    request.upload.onprogress = ({ loaded }) => {
      watch();
      onProgress(Math.min(loaded, bytes.size));
    };
    request.onload = () => {
      const etag = request.getResponseHeader('ETag');
      if (request.status !== 200)
        return end(new LostPart(request.status, 'The store did not take a part of the file.'));
      if (!etag) return end(new LostPart(request.status, 'The store did not say what it received.'));
      end(null);
      resolve(etag);
    };
    request.onerror = () => end(new LostPart(0, 'The connection broke while the file was sent.'));
    request.onabort = () => end(signal.aborted ? signal.reason : new LostPart(0, 'The connection stood still.'));
    signal.addEventListener('abort', stop);
    watch();
    request.send(bytes);
  });
}
