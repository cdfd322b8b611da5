import { Canvas, useThree } from '@react-three/fiber';
import { useEffect, useLayoutEffect, useMemo } from 'react';
import {
  AmbientLight,
  BufferGeometry,
  DirectionalLight,
  Float32BufferAttribute,
  Group,
  LineBasicMaterial,
  LineLoop,
  LineSegments,
  Mesh,
  type PerspectiveCamera,
} from 'three';
import { edgeLines } from './edge-lines.js';
import { eyeOf, type Orbit } from './orbit.js';
import { printedMaterial } from './printed-material.js';
import type { DrawnColours } from './use-drawn-colours.js';

export { readModel } from './read-model.js';

const fovDeg = 26;
/** A little air around the part. */
const airFactor = 1.02;

/** The outline of the box on the bed, so that one sees which side is down. */
function bedOutline(model: BufferGeometry): BufferGeometry {
  model.computeBoundingBox();
  const { min, max } = model.boundingBox!;
  const corners = [min.x, min.z, max.x, min.z, max.x, max.z, min.x, max.z];
  const points = [0, 2, 4, 6].flatMap((at) => [corners[at]!, min.y, corners[at + 1]!]);
  return new BufferGeometry().setAttribute('position', new Float32BufferAttribute(points, 3));
}

/** The part, its edges, the bed under it, and the lights, as one thing to draw and to throw away. */
function sceneOf(model: BufferGeometry, colours: DrawnColours, radius: number) {
  const body = new Mesh(model, printedMaterial(colours.kit, radius));
  const edges = new LineSegments(edgeLines(model), new LineBasicMaterial({ color: colours.deep }));
  const bed = new LineLoop(bedOutline(model), new LineBasicMaterial({ color: colours.hairline }));
  // Lines lie on the faces; without this they would fight for the same depth.
  Object.assign(body.material, { polygonOffset: true, polygonOffsetFactor: 1, polygonOffsetUnits: 1 });
  const scene = new Group().add(body, edges, bed);
  const dispose = () => {
    for (const part of [edges, bed]) part.geometry.dispose();
    for (const part of [body, edges, bed]) part.material.dispose();
  };
  return { scene, dispose };
}

interface Looking {
  orbit: Orbit;
  radius: number;
  size: { width: number; height: number };
}

function aim(eye: PerspectiveCamera, { orbit, radius, size }: Looking): void {
  // A narrow view is filled by its width.
  const narrow = Math.max(1, size.height / Math.max(1, size.width));
  eye.position.set(...eyeOf(orbit, radius * airFactor * narrow, fovDeg));
  eye.near = radius / 50;
  eye.far = radius * 60;
  eye.lookAt(0, 0, 0);
  eye.updateProjectionMatrix();
}

function Eye({ orbit, radius }: Pick<Looking, 'orbit' | 'radius'>) {
  const { camera, invalidate, size } = useThree();
  useLayoutEffect(() => {
    aim(camera as PerspectiveCamera, { orbit, radius, size });
    invalidate();
  }, [camera, invalidate, orbit, radius, size]);
  // The light comes over the looker's left shoulder, so that every turn shows the faces differently.
  useEffect(() => {
    const light = new DirectionalLight('white', 2.4);
    light.position.set(-radius * 2, radius * 3, radius);
    camera.add(light, light.target);
    light.target.position.set(0, 0, -radius * 4);
    return () => void camera.remove(light, light.target);
  }, [camera, radius]);
  return <primitive object={camera} />;
}

export interface PartModelProps {
  model: BufferGeometry;
  orbit: Orbit;
  colours: DrawnColours;
  /** The browser took the drawing surface away. */
  onLost: () => void;
}

/** A part to turn about: drawn anew only when something moved. */
export function PartModel({ model, orbit, colours, onLost }: PartModelProps) {
  const radius = model.boundingSphere?.radius ?? 1;
  const { scene, dispose } = useMemo(() => sceneOf(model, colours, radius), [model, colours, radius]);
  const ambient = useMemo(() => new AmbientLight('white', 1.7), []);
  useEffect(() => dispose, [dispose]);
  return (
    <Canvas
      flat
      frameloop="demand"
      dpr={[1, 2]}
      camera={{ fov: fovDeg }}
      gl={{ antialias: true, alpha: true }}
      onCreated={({ gl }) => gl.domElement.addEventListener('webglcontextlost', onLost)}
      aria-hidden
    >
      <primitive object={ambient} />
      <primitive object={scene} />
      <Eye orbit={orbit} radius={radius} />
    </Canvas>
  );
}
