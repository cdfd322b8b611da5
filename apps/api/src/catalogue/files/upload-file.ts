import { Injectable } from '@nestjs/common';
import type { Request, Response } from 'express';
import multer, { MulterError } from 'multer';
import { Storage, StorageFault } from '../../adapters/storage/storage.js';
import { InjectConfig, type Config } from '../../config/config.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { Drafts } from '../revisions/drafts.js';
import { RevisionContents } from '../revisions/revision-contents.js';
import { AttachFile, type StoredContents } from './attach-file.js';
import { HashingStorage } from './hashing-storage.js';

/** Receives one file of a draft, straight into the storage. */
@Injectable()
export class UploadFile {
  constructor(
    @InjectConfig() private readonly config: Config,
    private readonly storage: Storage,
    private readonly drafts: Drafts,
    private readonly contents: RevisionContents,
    private readonly attachFile: AttachFile,
  ) {}

  /** @returns the id of the file in the revision */
  async receive(person: SignedIn, revisionId: string, request: Request, response: Response): Promise<string> {
    const revision = await this.drafts.check(revisionId);
    const files = await this.contents.filesOf(revision.id);
    const engine = new HashingStorage(this.storage, {
      fileBytes: this.config.MAX_FILE_BYTES,
      revisionBytes: this.config.MAX_REVISION_BYTES,
      present: files,
    });
    await readMultipart(engine, request, response);
    const stored = request.file as StoredContents | undefined;
    if (!stored)
      throw new Refusal('validation-failed', 'No file came with this request. Send it in the field “file”.', {
        fields: { file: 'Send the file in this field.' },
      });
    // A hash announced after the file could not be looked at while the file came in.
    const announced = engine.announcedHash(request);
    if (announced !== undefined && announced !== stored.sha256) throw brokenOff();
    const { sha256, bytes, kind, fileName } = stored;
    return this.attachFile.attach(person, revision.id, { sha256, bytes, kind, fileName });
  }
}

const readMultipart = (engine: HashingStorage, request: Request, response: Response): Promise<void> =>
  new Promise((resolve, reject) => {
    const read = multer({
      storage: engine,
      defParamCharset: 'utf8',
      // Paths are to be seen and refused, not silently cut off.
      preservePath: true,
      limits: { files: 1, fields: 4, fieldSize: 1000 },
    }).single('file');
    void read(request, response, (fault: unknown) => (fault ? reject(toRefusal(fault)) : resolve()));
  });

const brokenOff = (): Refusal =>
  new Refusal('upload-broken-off', 'The file did not arrive as it was sent. Send it again.');

const toRefusal = (fault: unknown): unknown => {
  if (fault instanceof Refusal) return fault;
  if (fault instanceof StorageFault && fault.code === 'hash-mismatch') return brokenOff();
  if (fault instanceof MulterError)
    return new Refusal('bad-request', 'Send one file a request, in the field “file”.');
  const message = fault instanceof Error ? fault.message : '';
  return /^(Unexpected end|Request (aborted|closed|error)|Malformed|Multipart)/.test(message)
    ? brokenOff()
    : fault;
};
