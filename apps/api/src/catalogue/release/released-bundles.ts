import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type { Clearance } from '@windchest/contracts';
import { Kit } from '../kits/kit.model.js';
import type { Revision } from '../revisions/revision.model.js';
import { RevisionBundle } from './revision-bundle.model.js';
import { bundleName, servable, type ServableFile } from './stored-file-of.js';

/** A bundle, and the clearance it holds; null for the one that holds all there is. */
export interface BundleFile extends ServableFile {
  readonly clearance: Clearance | null;
}
export interface ClearanceBundle {
  readonly clearance: Clearance;
  readonly sha256: string;
  readonly bytes: number;
}

/** The bundles of released revisions: of all clearances in one, and of each by itself. */
@Injectable()
export class ReleasedBundles {
  constructor(
    @InjectModel(RevisionBundle) private readonly bundles: typeof RevisionBundle,
    @InjectModel(Kit) private readonly kits: typeof Kit,
  ) {}

  /** Those of one clearance, tightest first, by revision. */
  async ofEach(revisionIds: readonly string[]): Promise<Map<string, ClearanceBundle[]>> {
    const rows = await this.bundles.findAll({
      where: { revisionId: [...revisionIds] },
      order: ['clearance'],
    });
    const found = new Map<string, ClearanceBundle[]>(revisionIds.map((id) => [id, []]));
    for (const { revisionId, clearance, sha256, bytes } of rows)
      found.get(revisionId)?.push({ clearance, sha256, bytes });
    return found;
  }

  /** All of a revision as they may be handed out; none before it is released. */
  async filesOf(revision: Revision | null): Promise<BundleFile[]> {
    const kit = revision && (await this.kits.findByPk(revision.kitId));
    if (!kit || !revision?.bundleSha256) return [];
    const whole = { clearance: null, sha256: revision.bundleSha256, bytes: revision.bundleBytes ?? 0 };
    const others = (await this.ofEach([revision.id])).get(revision.id) ?? [];
    return [whole, ...others].map(({ clearance, sha256, bytes }) => ({
      clearance,
      ...servable('bundles', {
        sha256,
        bytes,
        fileName: bundleName(kit.slug, revision, clearance),
        contentType: 'application/zip',
      }),
    }));
  }
}
