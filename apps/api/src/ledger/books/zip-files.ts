import { Readable, Transform } from 'node:stream';
import { pipeline } from 'node:stream/promises';
import { ZipArchive } from 'archiver';
import type { HashedObject, Storage } from '../../adapters/storage/storage.js';
import type { YearFile } from './year-files.js';

/** Writes files into a zip on the exports' shelf as they are read, one after the other. */
export const zipFiles = async (
  storage: Storage,
  files: readonly YearFile[],
  { date, onLine }: { date: Date; onLine: () => void },
): Promise<HashedObject> => {
  const archive = new ZipArchive({ store: false });
  const way = new Transform({ transform: (chunk: Buffer, _, done) => done(null, chunk) });
  const piped = pipeline(archive, way);
  const stored = storage.putHashed('exports', way);
  // Failing while nobody waits for them yet must not end the process; they are waited for below.
  for (const work of [piped, stored]) work.catch(() => undefined);
  try {
    for (const file of files)
      await Promise.race([append(archive, file, date, onLine), failureOf(piped), failureOf(stored)]);
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

const append = (archive: ZipArchive, file: YearFile, date: Date, onLine: () => void): Promise<void> =>
  new Promise((resolve, reject) => {
    const source = Readable.from(counted(file.lines, onLine), { objectMode: false });
    const settle = (fault?: Error): void => {
      archive.off('entry', written).off('error', settle);
      if (fault) reject(fault);
      else resolve();
    };
    const written = (): void => settle();
    source.once('error', settle);
    archive.once('entry', written).once('error', settle);
    archive.append(source, { name: file.name, date, mode: 0o644 });
  });

async function* counted(lines: YearFile['lines'], onLine: () => void): AsyncGenerator<string> {
  for await (const line of lines) {
    onLine();
    yield line;
  }
}

/** Settles only if the work fails. */
const failureOf = (work: Promise<unknown>): Promise<never> =>
  new Promise((_, reject) => {
    work.catch(reject);
  });
