import { createWriteStream } from 'node:fs';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { pipeline } from 'node:stream/promises';
import type { Storage } from '../adapters/storage/storage.js';

/** Does work on stored files by their paths; what a store has no path for is copied here meanwhile. */
export const withLocalPaths = async <T>(
  storage: Storage,
  keys: readonly string[],
  work: (paths: string[]) => Promise<T>,
): Promise<T> => {
  let folder: string | null = null;
  try {
    const paths: string[] = [];
    for (const [at, key] of keys.entries()) {
      const standing = storage.localPath(key);
      if (standing === null) folder ??= await mkdtemp(join(tmpdir(), 'windchest-mesh-'));
      const path = standing ?? join(folder ?? '', `mesh-${at}`);
      if (standing === null) await pipeline(await storage.get(key), createWriteStream(path));
      paths.push(path);
    }
    return await work(paths);
  } finally {
    if (folder !== null) await rm(folder, { recursive: true, force: true });
  }
};
