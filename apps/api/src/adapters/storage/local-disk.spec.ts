import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { LocalDiskStorage } from './local-disk.js';
import { storageContract } from './storage.contract.js';

storageContract('the local disk', async () => {
  const folder = await mkdtemp(join(tmpdir(), 'windchest-storage-'));
  return { storage: new LocalDiskStorage(folder), close: () => rm(folder, { recursive: true }) };
});
