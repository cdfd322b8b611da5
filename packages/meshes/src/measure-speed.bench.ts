import { execFileSync } from 'node:child_process';
import { mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { geometryHash, measure, preview, outlines, readMesh, writeBinaryStl } from './index.js';

/** Speed of reading and measuring on a generated sphere, beside the `admesh` command where it is installed. */
const MEGABYTE = 1e6;
const TRIANGLES = 1_000_000;

function sphere(triangles: number): Float32Array {
  const rings = Math.round(Math.sqrt(triangles / 4));
  const sectors = 2 * rings;
  const point = (ring: number, sector: number): [number, number, number] => {
    const polar = (Math.PI * ring) / rings;
    const angle = (2 * Math.PI * (sector % sectors)) / sectors;
    const radius = ring === 0 || ring === rings ? 0 : Math.sin(polar);
    return [50 * radius * Math.cos(angle), 50 * radius * Math.sin(angle), 50 * Math.cos(polar)];
  };
  const corners: number[] = [];
  for (let ring = 0; ring < rings; ring += 1) {
    for (let sector = 0; sector < sectors; sector += 1) {
      const a = point(ring, sector),
        b = point(ring + 1, sector);
      const c = point(ring + 1, sector + 1),
        d = point(ring, sector + 1);
      if (ring < rings - 1) corners.push(...a, ...b, ...c);
      if (ring > 0) corners.push(...a, ...c, ...d);
    }
  }
  return Float32Array.from(corners);
}

function time<T>(label: string, bytes: number, work: () => T): T {
  let best = Infinity;
  let result: T | undefined;
  for (let run = 0; run < 3; run += 1) {
    const start = performance.now();
    result = work();
    best = Math.min(best, performance.now() - start);
  }
  console.log(
    `${label.padEnd(24)} ${(best / 1000).toFixed(2)} s  ${(bytes / MEGABYTE / (best / 1000)).toFixed(0)} MB/s`,
  );
  return result as T;
}

const bytes = writeBinaryStl(sphere(TRIANGLES));
console.log(`binary STL of ${(bytes.length / MEGABYTE).toFixed(1)} MB, best of three runs`);
const mesh = time('readMesh', bytes.length, () => readMesh(bytes, { fileName: 'sphere.stl' }));
const measured = time('readMesh + measure', bytes.length, () =>
  measure(readMesh(bytes, { fileName: 'sphere.stl' })),
);
time('geometryHash', bytes.length, () => geometryHash(mesh));
time('outlines, three views', bytes.length, () => outlines(mesh));
time('preview', bytes.length, () => preview(mesh));
console.log(`volume ${measured.volumeMm3.toFixed(1)} mm³, watertight: ${measured.watertight}`);

const folder = mkdtempSync(join(tmpdir(), 'mesh-speed-'));
try {
  const path = join(folder, 'sphere.stl');
  writeFileSync(path, bytes);
  time('admesh (exact check)', bytes.length, () =>
    execFileSync('admesh', ['--exact', path], { stdio: 'pipe' }),
  );
} catch (error) {
  const isMissing = error instanceof Error && 'code' in error && error.code === 'ENOENT';
  console.log(isMissing ? 'admesh is not installed: nothing to compare with' : String(error));
} finally {
  rmSync(folder, { recursive: true });
}
