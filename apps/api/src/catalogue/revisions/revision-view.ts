import { Injectable } from '@nestjs/common';
import { InjectModel } from '@nestjs/sequelize';
import type {
  Clearance,
  Part as PartShape,
  RevisionDetail,
  RevisionFile as FileShape,
} from '@windchest/contracts';
import { InjectConfig, type Config } from '../../config/config.js';
import { notFound } from '../../http/refusal.js';
import { Gates } from '../gates/gates.js';
import { isMeshKind } from '../files/file-kind.js';
import { Kit } from '../kits/kit.model.js';
import { ReleasedBundles } from '../release/released-bundles.js';
import { filesOfPart } from './part-files.js';
import { RevisionContents, type FileOfRevision, type PartOfRevision } from './revision-contents.js';
import { Revision } from './revision.model.js';

/** One revision in full, as the workshop works on it. */
@Injectable()
export class RevisionView {
  constructor(
    @InjectConfig() private readonly config: Config,
    @InjectModel(Kit) private readonly kits: typeof Kit,
    @InjectModel(Revision) private readonly revisions: typeof Revision,
    private readonly contents: RevisionContents,
    private readonly bundles: ReleasedBundles,
    private readonly gates: Gates,
  ) {}

  async read(revisionId: string): Promise<RevisionDetail> {
    const revision = await this.revisions.findByPk(revisionId);
    const kit = revision && (await this.kits.findByPk(revision.kitId));
    if (!revision || !kit) throw notFound('revision');
    const [files, parts, gates, bundles] = await Promise.all([
      this.contents.filesOf(revisionId),
      this.contents.partsOf(revisionId),
      this.gates.of(revision),
      this.bundles.ofEach([revisionId]),
    ]);
    const placeOf = placesOfFiles(parts);
    return {
      id: revision.id,
      kit: { id: kit.id, slug: kit.slug, name: kit.name, colour: kit.colour },
      label: revision.label,
      state: revision.state,
      createdAt: revision.createdAt.toISOString(),
      releasedAt: revision.releasedAt?.toISOString() ?? null,
      withdrawn: revision.withdrawnAt
        ? { at: revision.withdrawnAt.toISOString(), reason: revision.withdrawnReason ?? '' }
        : null,
      assemblyNotes: revision.assemblyNotes,
      changeNotes: revision.changeNotes,
      cautions: revision.cautions,
      printSpec: revision.printSpec,
      hardware: revision.hardware,
      buildVolume: revision.buildVolume,
      declaredCents: revision.declaredCents,
      room: revision.room,
      parts: parts.map((part) => toPart(part, placeOf)),
      documents: files.filter((file) => !isMeshKind(file.kind)).map((file) => toFile(file, placeOf)),
      gates,
      release: {
        state: revision.releaseState,
        percent: revision.releasePercent,
        fault: revision.releaseFault,
      },
      bundle:
        revision.bundleSha256 === null
          ? null
          : { sha256: revision.bundleSha256, bytes: revision.bundleBytes ?? 0 },
      bundles: bundles.get(revisionId) ?? [],
      totalBytes: files.reduce((sum, file) => sum + file.bytes, 0),
      limits: { fileBytes: this.config.MAX_FILE_BYTES, revisionBytes: this.config.MAX_REVISION_BYTES },
    };
  }

  async file(revisionId: string, fileId: string): Promise<FileShape> {
    const [files, parts] = await Promise.all([
      this.contents.filesOf(revisionId),
      this.contents.partsOf(revisionId),
    ]);
    const file = files.find((one) => one.id === fileId);
    if (!file) throw notFound('file');
    return toFile(file, placesOfFiles(parts));
  }

  async part(revisionId: string, partId: string): Promise<PartShape> {
    const parts = await this.contents.partsOf(revisionId);
    const part = parts.find((one) => one.id === partId);
    if (!part) throw notFound('part');
    return toPart(part, placesOfFiles(parts));
  }
}

type Places = ReadonlyMap<string, { readonly partId: string; readonly clearance: Clearance }>;

/** Which file is which clearance of which part. */
const placesOfFiles = (parts: readonly PartOfRevision[]): Places =>
  new Map(
    parts.flatMap((part) =>
      filesOfPart(part).map(({ clearance, file }) => [file.id, { partId: part.id, clearance }] as const),
    ),
  );

const toPart = (part: PartOfRevision, placeOf: Places): PartShape => ({
  id: part.id,
  code: part.code,
  name: part.name,
  quantity: part.quantity,
  orientation: part.orientation,
  printSpec: part.printSpec,
  voice: part.voice,
  isGauge: part.isGauge,
  file: part.file && toFile(part.file, placeOf),
  drawings: part.file?.drawings ?? null,
  previewBytes: part.file?.measured?.previewBytes ?? null,
  previewSha256: part.file?.previewSha256 ?? null,
  variants: part.variants.map(({ clearance, file }) => ({
    clearance,
    file: toFile(file, placeOf),
    drawings: file.drawings,
  })),
});

const toFile = (file: FileOfRevision, placeOf: Places): FileShape => ({
  id: file.id,
  sha256: file.sha256,
  fileName: file.fileName,
  bytes: file.bytes,
  kind: file.kind,
  measuring: file.measuring,
  measurement: measurementOf(file),
  fault: file.fault,
  partId: placeOf.get(file.id)?.partId ?? null,
  clearance: placeOf.get(file.id)?.clearance ?? null,
  addedAt: file.addedAt.toISOString(),
});

const measurementOf = ({ measured }: FileOfRevision): FileShape['measurement'] => {
  if (!measured) return null;
  const [x, y, z] = measured.sizeMm;
  return {
    format: measured.format,
    triangles: measured.triangles,
    shells: measured.shells,
    sizeMm: { x, y, z },
    volumeCm3: measured.volumeMm3 / 1000,
    areaCm2: measured.areaMm2 / 100,
    openEdges: measured.openEdges,
    nonManifoldEdges: measured.nonManifoldEdges,
    windingFaults: measured.windingFaults,
    degenerateTriangles: measured.degenerateTriangles,
    isWatertight: measured.watertight,
    unitRemark: measured.unitGuess.sentence,
  };
};
