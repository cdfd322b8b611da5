import type { PrintSpecification } from '@windchest/contracts';
import { kitTexts } from '../../config/texts/kit.js';
import { millimetres, number } from '../../lib/format.js';

/** What a part is printed with that the rest of the kit is not: `3 perimeters`, `100 % infill`. */
export function ownSettings(part: PrintSpecification, kit: PrintSpecification): string[] {
  const differs = (name: keyof PrintSpecification) => part[name] !== kit[name];
  return [
    ...(differs('material') ? [part.material] : []),
    ...(differs('nozzleMm') ? [kitTexts.nozzleSetting(millimetres(part.nozzleMm, 2))] : []),
    ...(differs('layerMm') ? [kitTexts.layerSetting(millimetres(part.layerMm, 2))] : []),
    ...(differs('perimeters') ? [kitTexts.perimetersOf(number(part.perimeters))] : []),
    ...(differs('topLayers') ? [kitTexts.topSetting(number(part.topLayers))] : []),
    ...(differs('bottomLayers') ? [kitTexts.bottomSetting(number(part.bottomLayers))] : []),
    ...(differs('infill') ? [kitTexts.infillSetting(number(part.infill * 100))] : []),
    ...(differs('supports') ? [kitTexts.supportSetting(kitTexts.supportKinds[part.supports])] : []),
  ];
}
