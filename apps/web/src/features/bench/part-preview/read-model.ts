import { BufferGeometry, Float32BufferAttribute, Mesh, Vector3 } from 'three';
import { GLTFLoader } from 'three/examples/jsm/loaders/GLTFLoader.js';

const mmPerMetre = 1000;

/** A preview's shape in mm, y up, its middle at the origin. */
export async function readModel(glb: ArrayBuffer): Promise<BufferGeometry> {
  const { scene } = await new GLTFLoader().parseAsync(glb, '');
  scene.updateMatrixWorld(true);
  const corners: number[] = [];
  const corner = new Vector3();
  scene.traverse((node) => {
    if (!(node instanceof Mesh)) return;
    const geometry = node.geometry as BufferGeometry;
    const points = geometry.getAttribute('position');
    const count = geometry.index?.count ?? points.count;
    for (let at = 0; at < count; at += 1) {
      corner.fromBufferAttribute(points, geometry.index?.getX(at) ?? at);
      corners.push(...corner.applyMatrix4(node.matrixWorld).multiplyScalar(mmPerMetre));
    }
  });
  if (corners.length === 0) throw new Error('This preview holds no triangles.');
  const model = new BufferGeometry().setAttribute('position', new Float32BufferAttribute(corners, 3));
  model.center();
  model.computeBoundingSphere();
  return model;
}
