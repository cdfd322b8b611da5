import { Readable } from 'node:stream';
import { Injectable } from '@nestjs/common';
import type { Request, Response } from 'express';
import multer, { MulterError } from 'multer';
import { keyOf, Storage } from '../adapters/storage/storage.js';
import { Refusal } from '../http/refusal.js';
import { pictureTypeOf, type PictureType } from './picture-kind.js';
import { withoutMetadata } from './without-metadata.js';

export interface StoredPicture {
  readonly sha256: string;
  readonly contentType: PictureType;
  readonly fileName: string;
  readonly bytes: number;
}

/** Small enough to be held in memory for a moment; pages make pictures smaller before they send them. */
const MAX_BYTES = 8 * 1024 * 1024;
const MAX_NAME = 120;
const receive = multer({
  storage: multer.memoryStorage(),
  defParamCharset: 'utf8',
  limits: { files: 1, fields: 4, fieldSize: 1000, fileSize: MAX_BYTES },
}).single('picture');

/** Takes pictures in, without what the camera wrote beside them, and hands them out. Who may see one, the rooms decide. */
@Injectable()
export class Pictures {
  constructor(private readonly storage: Storage) {}

  /** Reads the multipart field `picture`. @throws Refusal with a sentence that names the file */
  async receive(request: Request, response: Response): Promise<StoredPicture> {
    await new Promise<void>((resolve, reject) => {
      void receive(request, response, (fault: unknown) => (fault ? reject(toRefusal(fault)) : resolve()));
    });
    const { file } = request;
    if (!file) throw refused('No picture came with this request. Choose one and send it again.');
    const fileName = nameOf(file.originalname);
    const contentType = pictureTypeOf(file.buffer);
    if (!contentType)
      throw refused(
        `“${fileName}” is no PNG, JPEG or WebP picture. Save it as one of these and send it again.`,
      );
    const contents = withoutMetadata(file.buffer, contentType);
    const { sha256, bytes } = await this.storage.putHashed('pictures', Readable.from([contents]));
    return { sha256, contentType, fileName, bytes };
  }

  /** Sends a stored picture; its address may be kept by the browser, for its contents never change. */
  async send(response: Response, picture: Omit<StoredPicture, 'fileName'>, isPublic: boolean): Promise<void> {
    response.setHeader('ETag', `"${picture.sha256}"`);
    response.setHeader('Cache-Control', `${isPublic ? 'public' : 'private'}, max-age=3600`);
    response.setHeader('Content-Type', picture.contentType);
    response.setHeader('Content-Security-Policy', "default-src 'none'; sandbox");
    if (response.req.fresh) {
      response.status(304).end();
      return;
    }
    response.setHeader('Content-Length', picture.bytes);
    const contents = await this.storage.get(keyOf('pictures', picture.sha256));
    await new Promise<void>((resolve, reject) => {
      contents.once('error', reject);
      response.once('close', resolve);
      contents.pipe(response);
    });
  }
}

const refused = (sentence: string): Refusal =>
  new Refusal('file-refused', sentence, { fields: { picture: sentence } });

const nameOf = (given: string): string => {
  const name = (given.split(/[\\/]/).at(-1) ?? '').replace(/[\p{Cc}\p{Cf}]/gu, '').trim();
  return name === '' ? 'picture' : name.slice(-MAX_NAME);
};

const toRefusal = (fault: unknown): unknown => {
  if (!(fault instanceof MulterError)) return fault;
  if (fault.code === 'LIMIT_FILE_SIZE')
    return new Refusal(
      'file-too-large',
      'The picture is larger than 8 MiB. Make it smaller and send it again.',
    );
  return new Refusal('bad-request', 'Send one picture a request, in the field “picture”.');
};
