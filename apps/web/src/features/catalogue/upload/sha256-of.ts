import { createSHA256 } from 'hash-wasm';

const chunkBytes = 4 * 1024 * 1024;

const hex = (digest: ArrayBuffer): string =>
  [...new Uint8Array(digest)].map((byte) => byte.toString(16).padStart(2, '0')).join('');

/**
 * SHA-256 of a file, read piece by piece, so that a large one never lies in memory as a whole. Where a policy
 * forbids WebAssembly the browser's own digest is asked, which can only take the whole.
 */
export async function sha256Of(file: Blob, onProgress: (done: number) => void): Promise<string> {
  const hasher = await createSHA256().catch(() => null);
  if (!hasher) return hex(await crypto.subtle.digest('SHA-256', await file.arrayBuffer()));
  hasher.init();
  for (let from = 0; from < file.size; from += chunkBytes) {
    hasher.update(new Uint8Array(await file.slice(from, from + chunkBytes).arrayBuffer()));
    onProgress(Math.min(1, (from + chunkBytes) / file.size));
  }
  return hasher.digest('hex');
}
