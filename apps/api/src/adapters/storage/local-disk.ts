import { createHash, randomUUID } from 'node:crypto';
import { createReadStream, createWriteStream } from 'node:fs';
import { mkdir, open, rename, rm, stat } from 'node:fs/promises';
import { dirname, join, resolve } from 'node:path';
import { Transform, type Readable } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import {
  assertSafeKey,
  keyOf,
  Storage,
  StorageFault,
  type ByteRange,
  type HashedObject,
  type Shelf,
  type StoredObject,
} from './storage.js';

const CHUNK_BYTES = 1024 ** 2;

/** Files in a folder of this machine. A file appears under its key only when whole and on the disk. */
export class LocalDiskStorage extends Storage {
  private readonly root: string;

  constructor(folder: string) {
    super();
    this.root = resolve(folder);
  }

  async put(key: string, source: Readable): Promise<StoredObject> {
    assertSafeKey(key);
    return this.write(source, () => key);
  }

  async putHashed(
    shelf: Shelf,
    source: Readable,
    { expectedSha256 }: { expectedSha256?: string | undefined } = {},
  ): Promise<HashedObject> {
    const hash = createHash('sha256');
    const hashing = new Transform({
      transform: (chunk: Buffer, _, done) => {
        hash.update(chunk);
        done(null, chunk);
      },
    });
    let sha256 = '';
    const keyWhenWhole = (): string => {
      sha256 = hash.digest('hex');
      if (expectedSha256 !== undefined && sha256 !== expectedSha256)
        throw new StorageFault('hash-mismatch', 'The contents have another hash than was announced.');
      return keyOf(shelf, sha256);
    };
    const { bytes } = await this.write(source, keyWhenWhole, hashing);
    return { sha256, bytes, key: keyOf(shelf, sha256) };
  }

  /** Writes to a temporary file; its key is asked for once everything has been written. */
  private async write(source: Readable, keyWhenWhole: () => string, way?: Transform): Promise<StoredObject> {
    const half = join(this.root, 'incoming', randomUUID());
    // A source may break off before the pipeline stands; the pipeline then tells of it.
    source.on('error', () => undefined);
    await mkdir(dirname(half), { recursive: true });
    try {
      const sink = createWriteStream(half, { highWaterMark: CHUNK_BYTES });
      await (way ? pipeline(source, way, sink) : pipeline(source, sink));
      await flushToDisk(half);
      const { size } = await stat(half);
      const target = this.localPath(keyWhenWhole());
      await mkdir(dirname(target), { recursive: true });
      await rename(half, target);
      await flushToDisk(dirname(target));
      return { bytes: size };
    } finally {
      await rm(half, { force: true });
    }
  }

  async get(key: string, range?: ByteRange): Promise<Readable> {
    if (!(await this.head(key))) throw new StorageFault('missing', 'There is no file under this key.');
    return createReadStream(this.localPath(key), { ...range, highWaterMark: CHUNK_BYTES });
  }

  async head(key: string): Promise<StoredObject | null> {
    try {
      const { size } = await stat(this.localPath(key));
      return { bytes: size };
    } catch (fault) {
      if ((fault as NodeJS.ErrnoException).code === 'ENOENT') return null;
      throw fault;
    }
  }

  localPath(key: string): string {
    return join(this.root, assertSafeKey(key));
  }

  presign(): Promise<null> {
    return Promise.resolve(null);
  }

  async delete(key: string): Promise<void> {
    await rm(this.localPath(key), { force: true });
  }
}

/** A rename is only durable once file and folder are flushed. */
const flushToDisk = async (path: string): Promise<void> => {
  const handle = await open(path, 'r');
  try {
    await handle.sync();
  } finally {
    await handle.close();
  }
};
