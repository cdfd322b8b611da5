import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Answer, Handled } from '@windchest/contracts';
import { keyOf, Storage } from '../../adapters/storage/storage.js';
import { InjectConfig, type Config } from '../../config/config.js';
import type { SignedIn } from '../../http/person.js';
import { Refusal } from '../../http/refusal.js';
import { Drafts } from '../revisions/drafts.js';
import { AttachFile } from './attach-file.js';
import { decideKind } from './decide-kind.js';
import { safeFileName } from './file-name.js';
import { StoredFile } from './stored-file.model.js';
import { assertFileFits } from './upload-limits.js';

type OfferInput = Handled<'POST /workshop/revisions/:revisionId/offers'>;
type Offer = OfferInput['body']['files'][number];
type OfferAnswer = Answer<'POST /workshop/revisions/:revisionId/offers'>[number];

/**
 * Files are offered by hash before they are sent: what is stored already is attached at once, so that an
 * upload that broke off goes on where it stopped. Each offer stands alone.
 */
@Injectable()
export class OfferFiles {
  constructor(
    @InjectConfig() private readonly config: Config,
    @InjectModel(StoredFile) private readonly stored: typeof StoredFile,
    private readonly storage: Storage,
    private readonly drafts: Drafts,
    private readonly attachFile: AttachFile,
  ) {}

  async offer(person: SignedIn, { params, body }: OfferInput): Promise<OfferAnswer[]> {
    await this.drafts.check(params.revisionId);
    const answers: OfferAnswer[] = [];
    for (const file of body.files) answers.push(await this.answer(person, params.revisionId, file));
    return answers;
  }

  private async answer(person: SignedIn, revisionId: string, offer: Offer): Promise<OfferAnswer> {
    const { fileName, sha256 } = offer;
    try {
      const safeName = safeFileName(fileName);
      assertFileFits(safeName, offer.bytes, this.config.MAX_FILE_BYTES);
      const known = await this.stored.findByPk(sha256);
      if (!known || !(await this.storage.head(keyOf('files', sha256))))
        return { fileName, sha256, answer: 'send', detail: '' };
      const named = decideKind(safeName, { kind: known.kind });
      await this.attachFile.attach(person, revisionId, { sha256, bytes: known.bytes, ...named });
      return { fileName, sha256, answer: 'attached', detail: '' };
    } catch (fault) {
      if (!(fault instanceof Refusal) || fault.code === 'revision-is-released') throw fault;
      return { fileName, sha256, answer: 'refused', detail: fault.detail };
    }
  }
}
