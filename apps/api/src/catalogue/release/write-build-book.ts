import type { FilamentColour } from '@windchest/contracts';
import { bookVoices } from '../build-book/book-voices.js';
import { filamentHex } from '../build-book/kit-shades.js';
import { typesetBuildBook } from '../build-book/typeset-build-book.js';
import { tellingDrawing } from '../files/measured-mesh.js';
import { filesOfPart, hasVariants } from '../revisions/part-files.js';
import { compassOfRank, rankOf, voicingRoom } from '../kits/rank.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import type { Revision } from '../revisions/revision.model.js';

export interface BookSource {
  readonly workshop: string;
  readonly kit: {
    readonly slug: string;
    readonly name: string;
    readonly tagline: string;
    readonly colour: FilamentColour;
  };
  readonly revision: Revision;
  readonly parts: readonly PartOfRevision[];
}

/**
 * The build book of a revision about to be released. Its date is when the release was asked for, which
 * stays the same however often the bundle is built.
 */
export const writeBuildBook = ({ workshop, kit, revision, parts }: BookSource): Promise<Buffer> => {
  const rank = rankOf(parts);
  return typesetBuildBook({
    workshop: { name: workshop },
    kit: { name: kit.name, slug: kit.slug, tagline: kit.tagline, colourHex: filamentHex(kit.colour) },
    revision: { label: revision.label, releasedAt: revision.releaseAskedAt ?? revision.createdAt },
    declaredCents: revision.declaredCents,
    room: voicingRoom(revision.room),
    buildVolume: revision.buildVolume,
    compass: rank.length > 0 ? compassOfRank(rank, revision.room) : '',
    parts: parts.map(({ code, name, quantity, orientation, printSpec, file, isGauge, variants }) => ({
      code,
      name,
      quantity,
      isGauge,
      clearances: hasVariants({ variants })
        ? filesOfPart({ file, variants }).map((one) => ({
            clearance: one.clearance,
            fileName: one.file.fileName,
          }))
        : [],
      orientation,
      sizeMm: file?.measured?.sizeMm ?? null,
      volumeCm3: file?.measured ? file.measured.volumeMm3 / 1000 : null,
      drawing: tellingDrawing(file?.drawings ?? null),
      printSpec,
    })),
    voices: bookVoices(rank, voicingRoom(revision.room)),
    printSpec: revision.printSpec,
    hardware: revision.hardware,
    assemblyNotes: revision.assemblyNotes,
    changeNotes: revision.changeNotes,
    cautions: revision.cautions,
  });
};
