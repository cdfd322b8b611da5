import contentDisposition from 'content-disposition';
import type { Response } from 'express';
import { keyOf, type Storage } from '../adapters/storage/storage.js';
import { Refusal } from '../http/refusal.js';

export interface StoredFile {
  readonly sha256: string;
  readonly bytes: number;
  readonly fileName: string;
  readonly contentType: string;
  readonly storageKey: ReturnType<typeof keyOf>;
}

const CHUNK_BYTES = 256 * 1024;

/**
 * Sends a stored file with a strong ETag from its hash, ranges (RFC 9110) and a safe name (RFC 6266).
 * A web server in front, or the object store itself, takes the bytes over where the settings say so.
 * @returns how much went out from here, and whether the last byte was among it
 */
export const sendStored = async (
  response: Response,
  file: StoredFile,
  storage: Storage,
  options: { accelPrefix: string | undefined; fileAddressSeconds: number },
): Promise<{ bytes: number; reachedEnd: boolean }> => {
  const disposition = contentDisposition(file.fileName);
  response.setHeader('ETag', `"${file.sha256}"`);
  response.setHeader('Content-Type', file.contentType);
  response.setHeader('Content-Disposition', disposition);
  response.setHeader('Cache-Control', 'private, no-transform, max-age=0');
  response.setHeader('Content-Security-Policy', "default-src 'none'; sandbox");

  const away = await storage.presign(file.storageKey, {
    expiresInSeconds: options.fileAddressSeconds,
    contentDisposition: disposition,
  });
  if (away) {
    response.redirect(302, away);
    return { bytes: 0, reachedEnd: true };
  }
  if (options.accelPrefix) {
    response.setHeader('X-Accel-Redirect', options.accelPrefix + file.storageKey);
    response.end();
    return { bytes: 0, reachedEnd: true };
  }
  const path = storage.localPath(file.storageKey);
  if (!path) throw new Refusal('internal', 'This storage can neither give a path nor an address.');
  return sendLocal(response, path, file.bytes);
};

const sendLocal = (
  response: Response,
  path: string,
  bytes: number,
): Promise<{ bytes: number; reachedEnd: boolean }> =>
  new Promise((resolve, reject) => {
    const startedAt = response.socket?.bytesWritten ?? 0;
    const result = (isWhole: boolean): { bytes: number; reachedEnd: boolean } => {
      const range = /bytes (\d+)-(\d+)\//.exec(String(response.getHeader('Content-Range') ?? ''));
      const length = Number(response.getHeader('Content-Length') ?? 0);
      const last = range ? Number(range[2]) : bytes - 1;
      const hasBody = response.req.method === 'GET' && [200, 206].includes(response.statusCode);
      const sent =
        isWhole && hasBody
          ? length
          : Math.min(length, Math.max(0, (response.socket?.bytesWritten ?? startedAt) - startedAt));
      return { bytes: hasBody ? sent : 0, reachedEnd: isWhole && hasBody && last === bytes - 1 };
    };
    // Larger chunks than the default 64 KiB are faster; much larger ones cost more in fresh memory than they gain. `send` hands options on to the stream.
    const options = {
      acceptRanges: true,
      etag: false,
      lastModified: false,
      cacheControl: false,
      dotfiles: 'allow',
      highWaterMark: CHUNK_BYTES,
    } as const;
    response.sendFile(path, options, (fault?: Error & { code?: string; status?: number }) => {
      if (!fault) return resolve(result(true));
      if (fault.code === 'ECONNABORTED' || fault.code === 'ECONNRESET' || fault.code === 'EPIPE')
        return resolve(result(false));
      if (fault.status === 416)
        return reject(
          new Refusal(
            'range-not-satisfiable',
            `The file has ${bytes} bytes; the range asked for lies outside.`,
          ),
        );
      reject(fault);
    });
  });
