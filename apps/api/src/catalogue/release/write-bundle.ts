import { Transform, type Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ZipArchive } from 'archiver';
import type { HashedObject, Storage } from '../../adapters/storage/storage.js';
import type { BundleEntry } from './bundle-entry.js';

/** The first date a zip can hold; a real one would make every build differ. */
const FIXED_DATE = new Date('1980-01-01T00:00:00Z');
const FILE_MODE = 0o644;

/**
 * Writes entries into a stored (not compressed) zip on the bundles' shelf, one strictly after the other, so
 * that the same entries give the same bytes.
 */
export const writeBundle = async (
  storage: Storage,
  entries: readonly BundleEntry[],
  onProgress: (writtenBytes: number) => void,
): Promise<HashedObject> => {
  const archive = new ZipArchive({ store: true });
  let writtenBytes = 0;
  const way = new Transform({
    highWaterMark: 1024 ** 2,
    transform: (chunk: Buffer, _, done) => {
      onProgress((writtenBytes += chunk.length));
      done(null, chunk);
    },
  });
  const piped = pipeline(archive, way);
  // Failing while nobody waits for it yet must not end the process; it is waited for below.
  piped.catch(() => undefined);
  const stored = storage.putHashed('bundles', way);
  stored.catch(() => undefined);
  try {
    await Promise.race([fill(archive, storage, entries), failureOf(piped), failureOf(stored)]);
    await archive.finalize();
    await piped;
    return await stored;
  } catch (fault) {
    archive.abort();
    way.destroy(fault as Error);
    await stored.catch(() => undefined);
    throw fault;
  }
};

const fill = async (
  archive: ZipArchive,
  storage: Storage,
  entries: readonly BundleEntry[],
): Promise<void> => {
  for (const entry of entries) {
    if ('contents' in entry) {
      await append(archive, entry.path, entry.contents);
      continue;
    }
    const source = await storage.get(entry.storageKey);
    try {
      await append(archive, entry.path, source);
    } finally {
      source.destroy();
    }
  }
};

const append = (archive: ZipArchive, name: string, source: Buffer | Readable): Promise<void> =>
  new Promise((resolve, reject) => {
    const settle = (fault?: Error): void => {
      archive.off('entry', written).off('error', settle).off('close', closed);
      if (fault) reject(fault);
      else resolve();
    };
    const written = (): void => settle();
    const closed = (): void => settle(new Error('The bundle was closed before it was complete.'));
    archive.once('entry', written).once('error', settle).once('close', closed);
    if (!Buffer.isBuffer(source)) source.once('error', settle);
    archive.append(source, { name, date: FIXED_DATE, mode: FILE_MODE });
  });

/** Settles only if the work fails. */
const failureOf = (work: Promise<unknown>): Promise<never> =>
  new Promise((_, reject) => {
    work.catch(reject);
  });
