import type { Gate } from '@windchest/contracts';
import { eachMesh } from '../revisions/part-files.js';
import type { PartOfRevision } from '../revisions/revision-contents.js';
import type { BuildVolume } from '../revisions/revision.model.js';
import { counted, listed, open, passed, type GateCheck } from './gate-facts.js';

export const partsMeasured: GateCheck = ({ parts }) => {
  const name = 'parts-measured';
  if (parts.length === 0) return open(name, 'There are no parts yet. Upload their meshes.');
  const meshes = eachMesh(parts);
  const faults = [
    ...saying(parts, (part) => !part.file, 'has no file', 'have no file'),
    ...meshes.flatMap(({ file }) => (file?.measuring === 'refused' && file.fault ? [file.fault] : [])),
    ...saying(
      meshes,
      ({ file }) => file?.measuring === 'waiting' || file?.measuring === 'measuring',
      'is being measured',
      'are being measured',
    ),
  ];
  return faults.length > 0
    ? open(name, faults.join(' '))
    : passed(name, `${counted(parts.length, 'part')} measured.`);
};

export const watertight: GateCheck = ({ parts }) => {
  const name = 'watertight';
  const leaks = eachMesh(parts).flatMap(({ code, file }) => {
    if (!file?.measured || file.measured.watertight) return [];
    const { openEdges, nonManifoldEdges, windingFaults, shells } = file.measured;
    const faults = [
      ...(openEdges > 0 ? [counted(openEdges, 'open edge')] : []),
      ...(nonManifoldEdges > 0
        ? [
            counted(
              nonManifoldEdges,
              'edge shared by too many triangles',
              'edges shared by too many triangles',
            ),
          ]
        : []),
      ...(windingFaults > 0
        ? [counted(windingFaults, 'edge with its sides turned', 'edges with their sides turned')]
        : []),
      ...(shells === 0 ? ['no closed shell'] : []),
    ];
    return [`${code} (${faults.join(', ')})`];
  });
  if (leaks.length > 0) return open(name, `Not watertight: ${listed(leaks)}.`);
  return allMeasured(parts) ? passed(name, 'Every part is watertight.') : notKnownYet(name);
};

export const fitsBuildVolume: GateCheck = ({ parts, revision: { buildVolume } }) => {
  const name = 'fits-build-volume';
  const volume = `${buildVolume.xMm} × ${buildVolume.yMm} × ${buildVolume.zMm} mm`;
  const tooBig = eachMesh(parts).flatMap((part) => {
    const excess = part.file?.measured && excessOf(part, part.file.measured.sizeMm, buildVolume);
    return excess ? [`${part.code} is ${excess}`] : [];
  });
  if (tooBig.length > 0) return open(name, `Too big for ${volume}: ${listed(tooBig)}.`);
  return allMeasured(parts) ? passed(name, `Every part fits ${volume}.`) : notKnownYet(name);
};

const AXES = ['wide', 'deep', 'tall'] as const;
/** Below this a box is as large as the volume: sizes come from single-precision coordinates. */
const SAME_MM = 0.001;

/** By how much a part is too big in the best of the ways it may lie; null where one fits. */
const excessOf = (
  { orientation }: PartOfRevision,
  size: readonly [number, number, number],
  volume: BuildVolume,
): string | null => {
  const [x, y, z] = size;
  const upright = [[x, y, z], ...(orientation === 'as-exported' ? [] : [[y, x, z]])];
  const lying =
    orientation === 'may-lie'
      ? [
          [x, z, y],
          [z, x, y],
          [y, z, x],
          [z, y, x],
        ]
      : [];
  const limits = [volume.xMm, volume.yMm, volume.zMm];
  const ways = [...upright, ...lying].map((way) => way.map((mm, axis) => mm - limits[axis]!));
  const best = ways.reduce((least, way) => (Math.max(...way) < Math.max(...least) ? way : least));
  const over = AXES.flatMap((word, axis) =>
    best[axis]! > SAME_MM ? [`${best[axis]!.toFixed(1)} mm too ${word}`] : [],
  );
  return over.length > 0 ? over.join(' and ') : null;
};

/** Nobody can answer for a fault that is not known. */
const notKnownYet = (name: Gate['name']): Gate => ({
  ...open(name, 'Known when every part is measured.'),
  mayBeWaived: false,
});

const allMeasured = (parts: readonly PartOfRevision[]): boolean =>
  parts.length > 0 && eachMesh(parts).every((part) => part.file?.measured);

const saying = (
  parts: readonly PartOfRevision[],
  is: (part: PartOfRevision) => boolean,
  one: string,
  many: string,
): string[] => {
  const codes = parts.filter(is).map((part) => part.code);
  return codes.length === 0 ? [] : [`${listed(codes)} ${codes.length === 1 ? one : many}.`];
};
