/** The parts of s3rver 3.7.1 that the fake store builds on; the package brings no types. */

declare module 's3rver' {
  import type { IncomingMessage, Server } from 'node:http';
  import type { AddressInfo } from 'node:net';
  import type { Readable } from 'node:stream';
  import type FilesystemStore from 's3rver/lib/stores/filesystem.js';

  /** The request context of Koa, as far as it is used here. */
  export interface S3Context {
    req: IncomingMessage | (Readable & { headers: IncomingMessage['headers']; url?: string; method?: string });
    method: string;
    headers: IncomingMessage['headers'];
    status: number;
    body: unknown;
    set(header: string, value: string): void;
  }
  export type S3Middleware = (ctx: S3Context, next: () => Promise<unknown>) => Promise<unknown>;

  export default class S3rver {
    constructor(options: {
      directory: string;
      address: string;
      port: number;
      silent: boolean;
      vhostBuckets: boolean;
      configureBuckets?: { name: string; configs: string[] }[];
    });
    middleware: S3Middleware[];
    store: FilesystemStore;
    context: { store: FilesystemStore };
    httpServer: Server;
    silent: boolean;
    on(event: 'error', listener: (error: Error) => void): this;
    run(): Promise<AddressInfo>;
    close(): Promise<void>;
  }
}

declare module 's3rver/lib/stores/filesystem.js' {
  import type S3Object from 's3rver/lib/models/object.js';

  export type Metadata = Record<string, string>;

  export default class FilesystemStore {
    constructor(directory: string);
    rootDirectory: string;
    getResourcePath(bucket: string, key: string | undefined, resource: string): string;
    getMetadata(bucket: string, key: string): Promise<Metadata & { etag: string }>;
    putMetadata(bucket: string, key: string, metadata: Metadata, md5?: string): Promise<void>;
    getSubresource(bucket: string, key: undefined, type: 'cors'): Promise<CorsConfiguration | null>;
    getBucket(bucket: string): Promise<{ name: string } | null>;
    existsObject(bucket: string, key: string): Promise<boolean>;
    listObjects(
      bucket: string,
      options: { delimiter?: string | undefined; prefix?: string | undefined; startAfter?: string; maxKeys: number },
    ): Promise<{ objects: S3Object[]; commonPrefixes: string[]; isTruncated: boolean }>;
    getObject(bucket: string, key: string, range?: { start?: number; end?: number }): Promise<S3Object | null>;
    putObject(object: S3Object): Promise<{ size: number; md5: string }>;
    putPart(
      bucket: string,
      uploadId: string,
      partNumber: string,
      content: import('node:stream').Readable,
    ): Promise<{ size: number; md5: string }>;
    putObjectMultipart(
      bucket: string,
      uploadId: string,
      parts: { number: number; etag: string }[],
    ): Promise<{ size: number; md5: string }>;
    copyObject(
      fromBucket: string,
      fromKey: string,
      toBucket: string,
      toKey: string,
      metadata: Metadata | null,
    ): Promise<Metadata>;
  }

  type CorsRule = { hasWildcardOrigin: boolean; exposeHeaders: string[] };
  type CorsConfiguration = { matchRule(origin: string, method: string): CorsRule | undefined };
}

declare module 's3rver/lib/models/object.js' {
  import type { Readable } from 'node:stream';

  export default class S3Object {
    constructor(bucket: string, key: string, content: Readable | Buffer | null, metadata: Record<string, string>);
    bucket: string;
    key: string;
    content: (Readable & { headers?: Record<string, string | undefined> }) | Buffer | null;
    metadata: Record<string, string>;
    range?: { start: number; end: number };
    readonly size: number;
    readonly lastModifiedDate: Date;
  }
}

declare module 's3rver/lib/models/error.js' {
  export default class S3Error extends Error {
    constructor(code: string, message: string, detail?: Record<string, string>);
    code: string;
    status: number;
  }
}

declare module 's3rver/lib/models/account.js' {
  export default class Account {
    constructor(id: string, displayName: string);
    static registry: Map<string, Account>;
    accessKeys: Map<string, string>;
    createKeyPair(accessKeyId: string, secretAccessKey: string): void;
    revokeAccessKey(accessKeyId: string): void;
  }
}
