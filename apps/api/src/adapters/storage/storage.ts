import type { Readable } from 'node:stream';

export interface StoredObject {
  readonly bytes: number;
}
export interface HashedObject extends StoredObject {
  readonly sha256: string;
  readonly key: string;
}

/** Bytes `start` to `end`, both counted from 0 and both included. */
export interface ByteRange {
  readonly start: number;
  readonly end: number;
}

/**
 * Where files stand, by key. Keys are made by the callers from hashes (`keyOf`); a wrapper refuses
 * anything else. Putting the same key twice is no fault: keys name contents.
 */
export abstract class Storage {
  /** Takes a stream in and makes it visible under its key at once or not at all. */
  abstract put(key: string, source: Readable): Promise<StoredObject>;
  /**
   * The same for contents whose hash is not known yet: hashed on the way, visible under their hash when whole.
   * @throws StorageFault `hash-mismatch` where a hash was expected and another came out; nothing is kept
   */
  abstract putHashed(
    shelf: Shelf,
    source: Readable,
    options?: { expectedSha256?: string | undefined },
  ): Promise<HashedObject>;
  /** @throws StorageFault `missing` */
  abstract get(key: string, range?: ByteRange): Promise<Readable>;
  /** @returns null where nothing stands under the key */
  abstract head(key: string): Promise<StoredObject | null>;
  /** A path on this machine for those who can serve files themselves, or null. */
  abstract localPath(key: string): string | null;
  /** An address the client may fetch from directly for a while, or null where the store has none. */
  abstract presign(
    key: string,
    options: { expiresInSeconds: number; contentDisposition: string },
  ): Promise<string | null>;
  abstract delete(key: string): Promise<void>;
}

export class StorageFault extends Error {
  constructor(
    readonly code: 'missing' | 'unsafe-key' | 'not-writable' | 'hash-mismatch',
    message: string,
  ) {
    super(message);
  }
}

const KEY = /^[a-z]+\/[0-9a-f]{2}\/[0-9a-f]{64}(\.[a-z0-9]{1,5})?$/;

/** @throws StorageFault `unsafe-key` */
export const assertSafeKey = (key: string): string => {
  if (!KEY.test(key))
    throw new StorageFault(
      'unsafe-key',
      'A storage key names a shelf, two hex digits and a SHA-256; this one does not.',
    );
  return key;
};

export type Shelf = 'files' | 'bundles' | 'previews' | 'pictures' | 'exports';
/** The key of contents with this SHA-256. */
export const keyOf = (shelf: Shelf, sha256: string): string =>
  assertSafeKey(`${shelf}/${sha256.slice(0, 2)}/${sha256}`);
