import type { DemoKit, DemoPart, DemoRevision } from './demo-types.js';
import { kitPlans } from './demo-workshop.js';
import { binaryStl } from './formats/binary-stl.js';
import { threeMf } from './formats/three-mf.js';
import { edgeFaults, type Solid, volumeMm3 } from './geometry/solid.js';

export interface GeneratedFile {
  fileName: string;
  bytes: Uint8Array;
}

/**
 * Draws the parts of one revision of a demo kit, in the order of its parts, each followed by its other
 * clearances: the same bytes every time.
 *
 * @throws Error naming the kit or revision that the demo workshop does not have, or a part that did not come out as a closed solid
 */
export function generateFiles(
  kit: Pick<DemoKit, 'slug'>,
  revision: Pick<DemoRevision, 'label'>,
): GeneratedFile[] {
  const planned = kitPlans.find((plan) => plan.kit.slug === kit.slug)?.planned.get(revision.label);
  if (!planned) throw new Error(`The demo workshop has no ${kit.slug} ${revision.label}.`);
  return planned.flatMap(({ part, shape, variantShapes }) => [
    drawFile(part, part.fileName, shape),
    ...part.variants.map(({ clearance, fileName }) =>
      drawFile(part, fileName, variantShapes[clearance] ?? shape),
    ),
  ]);
}

function drawFile(part: DemoPart, fileName: string, shape: () => Solid): GeneratedFile {
  const solid = shape();
  if (edgeFaults(solid) > 0 || volumeMm3(solid) <= 0) {
    throw new Error(`${fileName} is not a closed solid; mend its drawing.`);
  }
  const title = `${part.code} ${part.name}, Saltmarsh Sound Works`;
  return { fileName, bytes: part.fileFormat === '3mf' ? threeMf(solid, title) : binaryStl(solid, title) };
}
