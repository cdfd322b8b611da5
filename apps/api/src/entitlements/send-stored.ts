import contentDisposition from 'content-disposition';
import type { Request, Response } from 'express';
import { keyOf, type Storage } from '../adapters/storage/storage.js';
import { Refusal } from '../http/refusal.js';
import { pumpFile } from './pump-file.js';

export interface StoredFile {
  readonly sha256: string;
  readonly bytes: number;
  readonly fileName: string;
  readonly contentType: string;
  readonly storageKey: ReturnType<typeof keyOf>;
}

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

/** Answers as RFC 9110 has it: 304 for what the client has, 206 for one range, 416 for one outside, else 200. */
const sendLocal = async (
  response: Response,
  path: string,
  bytes: number,
): Promise<{ bytes: number; reachedEnd: boolean }> => {
  const { req: request } = response;
  response.setHeader('Accept-Ranges', 'bytes');
  if (request.fresh) {
    response.status(304).end();
    return NOTHING;
  }
  const { start, end } = rangeOf(request, response, bytes);
  response.setHeader('Content-Length', String(end - start + 1));
  if (request.method === 'HEAD') {
    response.end();
    return NOTHING;
  }
  const sent = await pumpFile(response, path, start, end);
  return { bytes: sent, reachedEnd: start + sent === bytes && !response.errored };
};

const NOTHING = { bytes: 0, reachedEnd: false };

const rangeOf = (request: Request, response: Response, bytes: number): { start: number; end: number } => {
  const whole = { start: 0, end: bytes - 1 };
  const condition = request.headers['if-range'];
  if (condition !== undefined && condition !== response.getHeader('ETag')) return whole;
  const ranges = request.range(bytes, { combine: true });
  if (ranges === -1) {
    response.setHeader('Content-Range', `bytes */${bytes}`);
    throw new Refusal(
      'range-not-satisfiable',
      `The file has ${bytes} bytes; the range asked for lies outside.`,
    );
  }
  const [range] = Array.isArray(ranges) && ranges.type === 'bytes' ? ranges : [];
  // Several ranges at once are answered with the whole, as RFC 9110 allows.
  if (!range || (ranges as unknown[]).length > 1) return whole;
  response.status(206).setHeader('Content-Range', `bytes ${range.start}-${range.end}/${bytes}`);
  return range;
};
