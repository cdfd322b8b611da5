import { compassOfRank, rankOf } from '../kits/rank.js';
import type { BundleEntry, BundleSource } from './bundle-entry.js';

/** What a bundle holds, for programs to read. Everything in it follows from the revision alone. */
export const bundleManifest = (
  { kit, revision, parts, files, licences }: BundleSource,
  listed: readonly BundleEntry[],
): object => {
  const pathOf = new Map(listed.map((entry) => [entry.path.slice(entry.path.indexOf('/') + 1), entry.path]));
  const inPart = new Set(parts.flatMap((part) => (part.file ? [part.file.id] : [])));
  return {
    format: 'windchest-bundle',
    version: 1,
    kit: { slug: kit.slug, name: kit.name },
    revision: { id: revision.id, label: revision.label, mark: revision.mark, issue: revision.issue },
    licences: licences.map(({ kind, name }) => ({ kind, name })),
    compass: compassOfRank(rankOf(parts), revision.room),
    declaredCents: revision.declaredCents,
    room: revision.room,
    buildVolume: revision.buildVolume,
    printSpec: revision.printSpec,
    hardware: revision.hardware,
    parts: parts.map((part) => ({
      code: part.code,
      name: part.name,
      quantity: part.quantity,
      orientation: part.orientation,
      file: part.file && pathOf.get(part.file.fileName),
      sha256: part.file?.sha256 ?? null,
      bytes: part.file?.bytes ?? null,
      sizeMm: part.file?.measured?.sizeMm ?? null,
      volumeMm3: part.file?.measured?.volumeMm3 ?? null,
      printSpec: part.printSpec,
      voice: part.voice,
    })),
    documents: files
      .filter((file) => !inPart.has(file.id))
      .map((file) => ({ file: pathOf.get(file.fileName), sha256: file.sha256, bytes: file.bytes })),
    files: listed.map(({ path, sha256, bytes }) => ({ path, sha256, bytes })),
  };
};
