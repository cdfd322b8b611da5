import { createHash } from 'node:crypto';
import { clearanceSigns, type HardwareItem, type PrintSpecification } from '@windchest/contracts';
import { keyOf } from '../../adapters/storage/storage.js';
import { isMeshKind } from '../files/file-kind.js';
import type { Licence } from '../kits/licence.model.js';
import { filesOfPart } from '../revisions/part-files.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import type { Revision } from '../revisions/revision.model.js';
import type { BundleEntry, BundleSource } from './bundle-entry.js';
import { bundleManifest } from './bundle-manifest.js';
import { bundledFiles } from './bundled-files.js';

/** Everything a bundle holds, sorted by path; SHA256SUMS last, for it lists all others. */
export const bundleEntries = (source: BundleSource): BundleEntry[] => {
  const { kit, revision, licences } = source;
  const isLeftOut = leftOut(source);
  const files = source.files.filter((file) => !isLeftOut.has(file.id));
  const stored = files.map((file): BundleEntry => ({
    path: `${isMeshKind(file.kind) ? 'parts' : 'documents'}/${file.fileName}`,
    sha256: file.sha256,
    bytes: file.bytes,
    storageKey: keyOf('files', file.sha256),
  }));
  const words = [
    ...(source.buildBook ? [made('build-book.pdf', source.buildBook)] : []),
    ...(source.reprintList === undefined ? [] : [text('reprint-list.md', source.reprintList)]),
    text('assembly-notes.md', revision.assemblyNotes),
    ...(revision.changeNotes.trim() === '' ? [] : [text('change-notes.md', revision.changeNotes)]),
    text('print-specification.md', printSpecificationText(source)),
    text('hardware.md', hardwareText(revision.hardware)),
    text('cautions.md', revision.cautions),
    ...licences
      .toSorted((a, b) => order(a.kind, b.kind) || order(a.name, b.name) || order(a.id, b.id))
      .map((licence, at, all) =>
        text(licenceName(licence, at, all), licenceText(kit.name, revision, licence)),
      ),
  ];
  const listed = [...stored, ...words].toSorted((a, b) => order(a.path, b.path));
  const manifest = text('manifest.json', `${JSON.stringify(bundleManifest(source, listed), null, 2)}\n`);
  const summed = [...listed, manifest].toSorted((a, b) => order(a.path, b.path));
  return [...summed, text('SHA256SUMS', summed.map(({ sha256, path }) => `${sha256}  ${path}\n`).join(''))];
};

/** The clearances that were not asked for. */
const leftOut = ({ parts, clearance }: BundleSource): Set<string> => {
  const kept = new Set(parts.flatMap((part) => bundledFiles(part, clearance)).map(({ file }) => file.id));
  return new Set(
    parts
      .flatMap(filesOfPart)
      .map(({ file }) => file.id)
      .filter((id) => !kept.has(id)),
  );
};

/** By code units, the same on every machine. */
const order = (a: string, b: string): number => (a < b ? -1 : a > b ? 1 : 0);

const made = (path: string, contents: Buffer): BundleEntry => ({
  path,
  contents,
  bytes: contents.length,
  sha256: createHash('sha256').update(contents).digest('hex'),
});

const text = (path: string, words: string): BundleEntry =>
  made(path, Buffer.from(words.endsWith('\n') || words === '' ? words : `${words}\n`, 'utf8'));

const licenceName = (licence: Licence, at: number, all: readonly Licence[]): string => {
  const earlier = all.slice(0, at).filter((one) => one.kind === licence.kind).length;
  return `LICENCE-${licence.kind}${earlier > 0 ? `-${earlier + 1}` : ''}.md`;
};

const licenceText = (kitName: string, revision: Revision, licence: Licence): string =>
  [
    `# ${kitName} ${revision.label}: ${licence.name}`,
    '',
    ...(licence.yearlyLimit === null ? [] : [`Up to ${licence.yearlyLimit} prints a year may be sold.`, '']),
    licence.terms,
  ].join('\n');

const hardwareText = (hardware: readonly HardwareItem[]): string =>
  [
    '# Hardware: what is not printed',
    '',
    ...(hardware.length === 0
      ? ['Nothing.']
      : hardware.map(
          ({ quantity, unit, name, remark }) =>
            `- ${quantity}${unit === '' ? ' ×' : ` ${unit}`} ${name}${remark === '' ? '' : ` (${remark})`}`,
        )),
  ].join('\n');

const specLines = (spec: PrintSpecification): string[] => [
  `- Nozzle: ${spec.nozzleMm} mm`,
  `- Layer: ${spec.layerMm} mm`,
  `- Perimeters: ${spec.perimeters}`,
  `- Top and bottom layers: ${spec.topLayers} and ${spec.bottomLayers}`,
  `- Infill: ${Math.round(spec.infill * 100)} %`,
  `- Material: ${spec.material}`,
  `- Supports: ${spec.supports.replace('-', ' ')}`,
  ...(spec.remarks.trim() === '' ? [] : ['', spec.remarks.trim()]),
];

const orientationWords: Record<PartOfRevision['orientation'], string> = {
  'as-exported': 'print it as it stands in the file',
  'may-turn': 'may be turned on the bed',
  'may-lie': 'may be laid on any side',
};

/** `, clearance +`, `, clearances 0, −, +`, or that it is the gauge. */
const clearanceWords = (part: PartOfRevision, wanted: BundleSource['clearance']): string => {
  const signs = bundledFiles(part, wanted).flatMap(({ clearance }) =>
    clearance ? [clearanceSigns[clearance]] : [],
  );
  return [
    ...(part.isGauge ? [', the gauge: print it first'] : []),
    ...(signs.length > 0 ? [`, ${signs.length === 1 ? 'clearance' : 'clearances'} ${signs.join(', ')}`] : []),
  ].join('');
};

const printSpecificationText = ({ kit, revision, parts, clearance }: BundleSource): string => {
  const { xMm, yMm, zMm } = revision.buildVolume;
  return [
    `# ${kit.name} ${revision.label}: print specification`,
    '',
    `Build volume: ${xMm} × ${yMm} × ${zMm} mm`,
    '',
    ...specLines(revision.printSpec),
    '',
    '## Parts',
    '',
    ...parts.map(
      (part) =>
        `- ${part.code} ${part.name}: ${part.quantity} ×, ${orientationWords[part.orientation]}${clearanceWords(part, clearance)}`,
    ),
    ...parts.flatMap(({ code, name, printSpec }) =>
      printSpec ? ['', `## ${code} ${name}`, '', ...specLines(printSpec)] : [],
    ),
  ].join('\n');
};
