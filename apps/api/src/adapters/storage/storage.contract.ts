import { createHash, randomBytes } from 'node:crypto';
import { Readable } from 'node:stream';
import { buffer } from 'node:stream/consumers';
import { keyOf, type Storage } from './storage.js';

/** What every storage must do; each driver's spec runs it. */
export const storageContract = (
  name: string,
  open: () => Promise<{ storage: Storage; close: () => Promise<void> }>,
): void => {
  describe(`${name} as a storage`, () => {
    let storage: Storage;
    let close: () => Promise<void>;
    const contents = randomBytes(300_000);
    const key = keyOf('files', createHash('sha256').update(contents).digest('hex'));

    beforeAll(async () => ({ storage, close } = await open()));
    afterAll(() => close());

    it('gives back what was put, whole and by range', async () => {
      expect(await storage.head(key)).toBeNull();
      expect(
        await storage.put(key, Readable.from([contents.subarray(0, 100_000), contents.subarray(100_000)])),
      ).toEqual({ bytes: 300_000 });
      expect(await buffer(await storage.get(key))).toEqual(contents);
      expect(await buffer(await storage.get(key, { start: 1000, end: 1999 }))).toEqual(
        contents.subarray(1000, 2000),
      );
      expect(await storage.head(key)).toEqual({ bytes: 300_000 });
    });

    it('hashes what is put without a key and stands it under its hash', async () => {
      const other = Buffer.concat([contents, Buffer.from('more')]);
      const sha256 = createHash('sha256').update(other).digest('hex');
      const stored = await storage.putHashed(
        'bundles',
        Readable.from([other.subarray(0, 7), other.subarray(7)]),
      );
      expect(stored).toEqual({ sha256, bytes: 300_004, key: keyOf('bundles', sha256) });
      expect(await buffer(await storage.get(stored.key))).toEqual(other);
      expect(await storage.putHashed('bundles', Readable.from([other]))).toEqual(stored);
      await storage.delete(stored.key);
    });

    it('keeps nothing where another hash was expected', async () => {
      const other = contents.subarray(0, 9000);
      await expect(
        storage.putHashed('files', Readable.from([other]), { expectedSha256: 'ef'.repeat(32) }),
      ).rejects.toMatchObject({ code: 'hash-mismatch' });
      expect(await storage.head(keyOf('files', createHash('sha256').update(other).digest('hex')))).toBeNull();
    });

    it('shows nothing of a hashed put that broke off', async () => {
      const start = contents.subarray(0, 5000);
      const broken = Readable.from(
        (async function* () {
          yield start;
          throw new Error('the sender went away');
        })(),
      );
      await expect(storage.putHashed('files', broken)).rejects.toThrow('the sender went away');
      expect(await storage.head(keyOf('files', createHash('sha256').update(start).digest('hex')))).toBeNull();
    });

    it('takes the same key twice without a fault', async () => {
      await storage.put(key, Readable.from([contents]));
      expect(await buffer(await storage.get(key))).toEqual(contents);
    });

    it('shows nothing of a put that broke off', async () => {
      const other = keyOf('files', 'ab'.repeat(32));
      const broken = Readable.from(
        (async function* () {
          yield contents.subarray(0, 1000);
          throw new Error('the sender went away');
        })(),
      );
      await expect(storage.put(other, broken)).rejects.toThrow('the sender went away');
      expect(await storage.head(other)).toBeNull();
    });

    it('says that a missing file is missing', async () => {
      await expect(storage.get(keyOf('bundles', 'cd'.repeat(32)))).rejects.toMatchObject({ code: 'missing' });
    });

    it('refuses keys that are no keys', async () => {
      for (const bad of ['../../etc/passwd', 'files/../x', 'files/ab/..', '/etc/passwd', ''])
        await expect((async () => storage.get(bad))()).rejects.toMatchObject({ code: 'unsafe-key' });
    });

    it('deletes, also twice', async () => {
      await storage.delete(key);
      await storage.delete(key);
      expect(await storage.head(key)).toBeNull();
    });
  });
};
