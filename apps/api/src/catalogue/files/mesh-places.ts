import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { VariantClearance } from '@windchest/contracts';
import { Clock } from '../../adapters/clock/clock.js';
import { newId } from '../../database/columns.js';
import type { Tx } from '../../database/transactions.js';
import { PartVariant } from '../revisions/part-variant.model.js';
import { Part } from '../revisions/part.model.js';
import { nextFreeCode, partFromName } from './part-from-name.js';
import type { RevisionFile } from './revision-file.model.js';

export interface Places {
  readonly parts: readonly Part[];
  readonly variants: readonly PartVariant[];
}

/** Where the meshes of a draft belong: which file is which part, in which clearance. */
@Injectable()
export class MeshPlaces {
  constructor(
    @InjectModel(Part) private readonly parts: typeof Part,
    @InjectModel(PartVariant) private readonly variants: typeof PartVariant,
    private readonly clock: Clock,
  ) {}

  async of(tx: Tx, revisionId: string): Promise<Places> {
    const found = { where: { revisionId }, transaction: tx };
    return { parts: await this.parts.findAll(found), variants: await this.variants.findAll(found) };
  }

  /** The file that stands where this name says a mesh belongs. */
  fileIdFor(fileName: string, { parts, variants }: Places): string | null {
    const { code, clearance } = partFromName(fileName);
    const part = parts.find((one) => one.code === code);
    if (!part || clearance === 'zero') return part?.fileId ?? null;
    return variants.find((one) => one.partId === part.id && one.clearance === clearance)?.fileId ?? null;
  }

  has(fileId: string, { parts, variants }: Places): boolean {
    return parts.some((one) => one.fileId === fileId) || variants.some((one) => one.fileId === fileId);
  }

  /** Gives a mesh its place: the part its name says, in the clearance it says; a new part where none has the code. */
  async keep(tx: Tx, file: RevisionFile, places: Places): Promise<void> {
    if (this.has(file.id, places)) return;
    const { code, name, clearance } = partFromName(file.fileName);
    const updatedAt = this.clock.now();
    const known = places.parts.find((part) => part.code === code);
    const part =
      known ??
      (await this.parts.create(
        {
          id: newId(),
          revisionId: file.revisionId,
          fileId: clearance === 'zero' ? file.id : null,
          code: code ?? nextFreeCode(places.parts.map((one) => one.code)),
          name,
          quantity: 1,
          orientation: 'may-turn',
          createdAt: updatedAt,
          updatedAt,
        },
        { transaction: tx },
      ));
    if (clearance !== 'zero') return this.keepVariant(tx, part, clearance, file.id);
    if (known) await known.update({ fileId: file.id, updatedAt }, { transaction: tx });
  }

  async keepVariant(tx: Tx, part: Part, clearance: VariantClearance, fileId: string): Promise<void> {
    const { id: partId, revisionId } = part;
    const there = await this.variants.findOne({ where: { partId, clearance }, transaction: tx });
    if (there) await there.update({ fileId }, { transaction: tx });
    else
      await this.variants.create({ id: newId(), revisionId, partId, clearance, fileId }, { transaction: tx });
  }
}
