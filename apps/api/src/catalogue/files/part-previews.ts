import { buffer } from 'node:stream/consumers';
import { Injectable } from '@nestjs/common';
import { InjectConnection } from '@nestjs/sequelize';
import type { Response } from 'express';
import type { Sequelize } from 'sequelize';
import { keyOf, Storage, StorageFault } from '../../adapters/storage/storage.js';
import { selectRows } from '../../database/rows.js';
import { Refusal } from '../../http/refusal.js';

export interface PreviewWish {
  readonly revisionId: string;
  readonly part: { readonly code: string } | { readonly id: string };
  /** The hash the address names, if it names one: then browsers may keep the answer for good. */
  readonly named: string | undefined;
  /** Whether caches on the way may keep it too. */
  readonly isPublic: boolean;
}

/** Hands out the coarse likeness of a part, never the part itself. */
@Injectable()
export class PartPreviews {
  constructor(
    @InjectConnection() private readonly database: Sequelize,
    private readonly storage: Storage,
  ) {}

  async send({ named, isPublic, ...wish }: PreviewWish, response: Response): Promise<void> {
    const sha256 = await this.hashOf(wish);
    const glb = sha256 && (await this.read(sha256));
    if (!sha256 || !glb)
      throw new Refusal(
        'not-found',
        'There is no preview of this part. One is made when its file is measured.',
      );
    const scope = isPublic ? 'public' : 'private';
    // Weak, since the answer may go out compressed.
    response.setHeader('ETag', `W/"${sha256}"`);
    // An address without the hash shows another preview once the next revision is out.
    const term = named === sha256 ? 'max-age=31536000, immutable' : 'no-cache';
    response.setHeader('Cache-Control', `${scope}, ${term}`);
    // Answers 304 where the browser names the ETag.
    response.type('model/gltf-binary').send(glb);
  }

  private async hashOf({
    revisionId,
    part,
  }: Pick<PreviewWish, 'revisionId' | 'part'>): Promise<string | null> {
    const [column, value] = 'id' in part ? ['id', part.id] : ['code', part.code];
    const [row] = await selectRows<{ sha256: string | null }>(
      this.database,
      `SELECT m.preview_sha256 AS sha256 FROM parts p JOIN revision_files f ON f.id = p.file_id
       JOIN measurements m ON m.sha256 = f.sha256 WHERE p.revision_id = :revisionId AND p.${column} = :value`,
      { revisionId, value },
    );
    return row?.sha256 ?? null;
  }

  private async read(sha256: string): Promise<Buffer | null> {
    try {
      return await buffer(await this.storage.get(keyOf('previews', sha256)));
    } catch (fault) {
      if (fault instanceof StorageFault && fault.code === 'missing') return null;
      throw fault;
    }
  }
}
