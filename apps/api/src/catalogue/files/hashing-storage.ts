import { Readable } from 'node:stream';
import type { Request } from 'express';
import type { StorageEngine } from 'multer';
import type { Storage } from '../../adapters/storage/storage.js';
import type { FileOfRevision } from '../revisions/revision-contents.js';
import type { StoredContents } from './attach-file.js';
import { decideKind } from './decide-kind.js';
import { safeFileName } from './file-name.js';
import { Glimpsing } from './glimpsing.js';
import { identifyContents } from './identify-contents.js';
import { assertFileFits, assertRevisionFits } from './upload-limits.js';

interface Limits {
  readonly fileBytes: number;
  readonly revisionBytes: number;
  readonly present: readonly FileOfRevision[];
}
type Took = (fault?: unknown, info?: Partial<Express.Multer.File> & Partial<StoredContents>) => void;

/** Streams an uploaded file to the storage while it is hashed, counted and recognised; never holds it in memory. */
export class HashingStorage implements StorageEngine {
  constructor(
    private readonly storage: Storage,
    private readonly limits: Limits,
  ) {}

  _handleFile(request: Request, file: Express.Multer.File, took: Took): void {
    this.store(request, file).then(
      (stored) => took(null, stored),
      (fault: unknown) => {
        file.stream.resume();
        took(fault);
      },
    );
  }

  /** What is stored is named by its contents and may be in use elsewhere, so nothing is taken back. */
  _removeFile(_request: Request, _file: Express.Multer.File, removed: (fault: Error | null) => void): void {
    removed(null);
  }

  /** What the browser says the file's SHA-256 is: a header, or a field before the file. */
  announcedHash(request: Request): string | undefined {
    const field = (request.body as { sha256?: unknown } | undefined)?.sha256;
    const announced = request.headers['x-content-sha256'] ?? field;
    return typeof announced === 'string' && announced !== '' ? announced.toLowerCase() : undefined;
  }

  private async store(request: Request, file: Express.Multer.File): Promise<StoredContents> {
    const name = safeFileName(file.originalname);
    const { limits } = this;
    const others = limits.present
      .filter((one) => one.fileName !== name)
      .reduce((sum, one) => sum + one.bytes, 0);
    let named: Pick<StoredContents, 'kind' | 'fileName'> | undefined;
    const glimpsing = new Glimpsing();
    /** What it throws breaks the storing off, so that nothing of a refused file is kept. */
    const judged = async function* (): AsyncGenerator<Buffer> {
      // Left open on a refusal, for multer reads the rest of the request before it answers.
      for await (const chunk of file.stream.iterator({ destroyOnReturn: false }) as AsyncIterable<Buffer>) {
        const bytesSoFar = glimpsing.see(chunk);
        assertFileFits(name, bytesSoFar, limits.fileBytes);
        assertRevisionFits(name, others + bytesSoFar, limits.revisionBytes);
        yield chunk;
      }
      named = decideKind(name, identifyContents(glimpsing.whole()));
    };
    const source = Readable.from(judged(), { objectMode: false });
    const { sha256, bytes } = await this.storage.putHashed('files', source, {
      expectedSha256: this.announcedHash(request),
    });
    return { sha256, bytes, ...named! };
  }
}
