import { MeshLambertMaterial } from 'three';

/** Layer lines up the part's whole extent; a true print's are too fine to be seen at this size. */
const linesOverPart = 64;

/** Flat faces in the kit's colour with the lines of a print, which go where they would run together. */
export function printedMaterial(colour: string, radiusMm: number): MeshLambertMaterial {
  const material = new MeshLambertMaterial({ color: colour, flatShading: true });
  const pitchMm = (2 * radiusMm) / linesOverPart;
  material.onBeforeCompile = (shader) => {
    shader.uniforms['pitchMm'] = { value: pitchMm };
    shader.vertexShader = shader.vertexShader
      .replace('#include <common>', '#include <common>\nvarying float heightMm;')
      .replace('#include <begin_vertex>', '#include <begin_vertex>\nheightMm = position.y;');
    shader.fragmentShader = shader.fragmentShader
      .replace('#include <common>', '#include <common>\nvarying float heightMm;\nuniform float pitchMm;')
      .replace(
        '#include <color_fragment>',
        `#include <color_fragment>
        float layer = heightMm / pitchMm;
        float spread = fwidth(layer);
        float line = smoothstep(0.5 - 1.4 * max(spread, 0.08), 0.5, abs(fract(layer) - 0.5));
        // Faces that lie flat have no layers to show.
        float seen = step(0.002, spread) * (1.0 - smoothstep(0.22, 0.42, spread));
        diffuseColor.rgb *= 1.0 - 0.16 * line * seen;`,
      );
  };
  return material;
}
