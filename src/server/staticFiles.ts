import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import type { IncomingMessage, ServerResponse } from 'node:http';
import { extname, join } from 'node:path';
import { brotliCompressSync, constants, gzipSync } from 'node:zlib';
import { accepts, isCompressible } from './compression';

const types: Record<string, string> = {
  '.css': 'text/css; charset=utf-8',
  '.ico': 'image/x-icon',
  '.js': 'text/javascript; charset=utf-8',
  '.json': 'application/json',
  '.png': 'image/png',
  '.svg': 'image/svg+xml',
  '.txt': 'text/plain; charset=utf-8',
  '.webmanifest': 'application/manifest+json',
  '.woff': 'font/woff',
  '.woff2': 'font/woff2',
  '.xlsx': 'application/vnd.openxmlformats-officedocument.spreadsheetml.sheet',
};

interface StaticFile {
  type: string;
  etag: string;
  /** Named after its content, so that it never changes. */
  immutable: boolean;
  bytes: Buffer;
  /** Compressed at the first request that takes it. */
  coded: Partial<Record<Coding, Buffer>>;
}

type Coding = 'br' | 'gzip';

const encoders: Record<Coding, (bytes: Buffer) => Buffer> = {
  br: (bytes) => brotliCompressSync(bytes, { params: { [constants.BROTLI_PARAM_QUALITY]: 8 } }),
  gzip: (bytes) => gzipSync(bytes, { level: 9 }),
};

/** The files that the build made, held in memory: a path is looked up, never resolved. */
export class StaticFiles {
  readonly #files = new Map<string, StaticFile>();

  /** @param folder what the build made for browsers; pages in it are left to the application */
  constructor(folder: string) {
    const entries = readdirSync(folder, { recursive: true, withFileTypes: true });
    for (const entry of entries) {
      if (!entry.isFile() || entry.name.startsWith('.') || entry.name.endsWith('.html')) continue;
      const path = join(entry.parentPath, entry.name);
      const bytes = readFileSync(path);
      const name = path.slice(folder.length).replaceAll('\\', '/');
      this.#files.set(name, {
        type: types[extname(name)] ?? 'application/octet-stream',
        etag: createHash('sha256').update(bytes).digest('base64url').slice(0, 22),
        immutable: name.startsWith('/_astro/'),
        bytes,
        coded: {},
      });
    }
  }

  /** Answers for a file; false when there is none at `path`. */
  serve(path: string, request: IncomingMessage, response: ServerResponse): boolean {
    const file = this.#files.get(path);
    if (!file || (request.method !== 'GET' && request.method !== 'HEAD')) return false;
    const coding = isCompressible(file.type) ? pickCoding(request) : null;
    const etag = `"${file.etag}${coding ? `-${coding}` : ''}"`;
    response.setHeader('etag', etag);
    response.setHeader(
      'cache-control',
      file.immutable ? 'public, max-age=31536000, immutable' : 'public, max-age=0, must-revalidate',
    );
    response.setHeader('vary', 'accept-encoding');
    if ((request.headers['if-none-match'] ?? '').includes(etag)) {
      response.writeHead(304).end();
      return true;
    }
    const body = coding ? (file.coded[coding] ??= encoders[coding](file.bytes)) : file.bytes;
    response.setHeader('content-type', file.type);
    if (coding) response.setHeader('content-encoding', coding);
    response.setHeader('content-length', body.length);
    response.writeHead(200).end(request.method === 'HEAD' ? undefined : body);
    return true;
  }
}

function pickCoding(request: IncomingMessage): Coding | null {
  const offered = request.headers['accept-encoding'];
  if (accepts(offered, 'br')) return 'br';
  return accepts(offered, 'gzip') ? 'gzip' : null;
}
