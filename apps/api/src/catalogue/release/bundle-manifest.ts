import { filesOfPart } from '../revisions/part-files.js';
import { compassOfRank, rankOf } from '../kits/rank.js';
import { bundledFiles } from './bundled-files.js';
import type { BundleEntry, BundleSource } from './bundle-entry.js';

/** What a bundle holds, for programs to read. Everything in it follows from the revision alone. */
export const bundleManifest = (source: BundleSource, listed: readonly BundleEntry[]): object => {
  const { kit, revision, parts, files, licences } = source;
  const pathOf = new Map(listed.map((entry) => [entry.path.slice(entry.path.indexOf('/') + 1), entry.path]));
  const inPart = new Set(parts.flatMap(filesOfPart).map(({ file }) => file.id));
  return {
    format: 'windchest-bundle',
    version: 1,
    kit: { slug: kit.slug, name: kit.name },
    revision: { id: revision.id, label: revision.label, mark: revision.mark, issue: revision.issue },
    /** Null where it holds every clearance there is. */
    clearance: source.clearance ?? null,
    /** Only what is to print again, in the pieces wanted; a whole bundle says nothing of it. */
    ...(source.reprintList === undefined ? {} : { contents: 'changed-parts' }),
    licences: licences.map(({ kind, name }) => ({ kind, name })),
    compass: compassOfRank(rankOf(parts), revision.room),
    declaredCents: revision.declaredCents,
    room: revision.room,
    buildVolume: revision.buildVolume,
    printSpec: revision.printSpec,
    hardware: revision.hardware,
    parts: parts.map((part) => {
      const [first, ...others] = bundledFiles(part, source.clearance).map(({ clearance, file }) => ({
        file: pathOf.get(file.fileName),
        clearance,
        sha256: file.sha256,
        bytes: file.bytes,
        sizeMm: file.measured?.sizeMm ?? null,
        volumeMm3: file.measured?.volumeMm3 ?? null,
      }));
      return {
        code: part.code,
        name: part.name,
        quantity: part.quantity,
        orientation: part.orientation,
        isGauge: part.isGauge,
        ...(first ?? noFile),
        variants: others,
        printSpec: part.printSpec,
        voice: part.voice,
      };
    }),
    documents: files
      .filter((file) => !inPart.has(file.id))
      .map((file) => ({ file: pathOf.get(file.fileName), sha256: file.sha256, bytes: file.bytes })),
    files: listed.map(({ path, sha256, bytes }) => ({ path, sha256, bytes })),
  };
};

const noFile = { file: null, clearance: null, sha256: null, bytes: null, sizeMm: null, volumeMm3: null };
