import { createHash } from 'node:crypto';
import { PassThrough, type Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { pipeline } from 'node:stream/promises';
import yauzl from 'yauzl';
import type { HashedObject, Storage } from '../../adapters/storage/storage.js';

const SUMS = 'SHA256SUMS';

/** A bundle that is not what was written. The message is a sentence for the workshop. */
export class BundleFault extends Error {}

/**
 * Reads a bundle back from the storage: the whole by its hash, then every entry against the sums within.
 * @throws BundleFault
 */
export const verifyBundle = async (storage: Storage, stored: HashedObject): Promise<void> => {
  const whole = await hashOf(await storage.get(stored.key));
  if (whole !== stored.sha256)
    throw new BundleFault('The stored bundle does not have the hash it was written with.');
  const hashes = new Map<string, string>();
  let sums = '';
  await eachEntry(storage, stored, async (name, contents) => {
    if (hashes.has(name)) throw new BundleFault(`The bundle holds “${name}” twice.`);
    if (name !== SUMS) return void hashes.set(name, await hashOf(contents));
    sums = (await buffer(contents)).toString('utf8');
    return undefined;
  });
  const listed = sums
    .split('\n')
    .flatMap((line) => (line === '' ? [] : [[line.slice(66), line.slice(0, 64)] as const]));
  for (const [name, sha256] of listed)
    if (hashes.get(name) !== sha256) throw new BundleFault(`“${name}” in the bundle does not match its sum.`);
  if (listed.length !== hashes.size || listed.length === 0)
    throw new BundleFault('The bundle does not hold exactly the files its sums list.');
};

const hashOf = async (source: Readable): Promise<string> => {
  const hash = createHash('sha256');
  await pipeline(source, hash);
  return hash.digest('hex');
};

/** Lets yauzl read from any storage by ranges. */
class StoredZip extends yauzl.RandomAccessReader {
  constructor(
    private readonly storage: Storage,
    private readonly key: string,
  ) {
    super();
  }

  override _readStreamForRange(start: number, end: number): Readable {
    const out = new PassThrough();
    this.storage
      .get(this.key, { start, end: end - 1 })
      .then((source) => pipeline(source, out))
      .catch((fault: Error) => out.destroy(fault));
    return out;
  }
}

const eachEntry = (
  storage: Storage,
  { key, bytes }: HashedObject,
  visit: (name: string, contents: Readable) => Promise<void>,
): Promise<void> =>
  new Promise((resolve, reject) => {
    yauzl.fromRandomAccessReader(
      new StoredZip(storage, key),
      bytes,
      { lazyEntries: true, strictFileNames: true },
      (fault, zip) => {
        if (fault) return reject(fault);
        zip.on('error', reject);
        zip.on('end', resolve);
        zip.on('entry', (entry: yauzl.Entry) => {
          zip.openReadStream(entry, (closed, contents) => {
            if (closed) return reject(closed);
            visit(entry.fileName, contents).then(() => zip.readEntry(), reject);
          });
        });
        zip.readEntry();
      },
    );
  });
