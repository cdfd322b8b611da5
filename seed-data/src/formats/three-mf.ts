import { zipSync } from 'fflate';
import type { Solid } from '../geometry/solid.js';

const contentTypes = `<?xml version="1.0" encoding="UTF-8"?>
<Types xmlns="http://schemas.openxmlformats.org/package/2006/content-types">
  <Default Extension="rels" ContentType="application/vnd.openxmlformats-package.relationships+xml"/>
  <Default Extension="model" ContentType="application/vnd.ms-package.3dmanufacturing-3dmodel+xml"/>
</Types>
`;

const relationships = `<?xml version="1.0" encoding="UTF-8"?>
<Relationships xmlns="http://schemas.openxmlformats.org/package/2006/relationships">
  <Relationship Target="/3D/3dmodel.model" Id="model" Type="http://schemas.microsoft.com/3dmanufacturing/2013/01/3dmodel"/>
</Relationships>
`;

/** A 3MF core package with one object in millimetres, placed once. */
export function threeMf(solid: Solid, title: string): Uint8Array {
  const text = new TextEncoder();
  // A fixed moment in local time (a zip stores local time): the same part gives the same bytes.
  const options = { level: 9 as const, mtime: new Date(1980, 0, 1) };
  return zipSync({
    '[Content_Types].xml': [text.encode(contentTypes), options],
    '_rels/.rels': [text.encode(relationships), options],
    '3D/3dmodel.model': [text.encode(model(solid, title)), options],
  });
}

function model(solid: Solid, title: string): string {
  const vertices = solid.vertices.map(([x, y, z]) => `          <vertex x="${x}" y="${y}" z="${z}"/>`);
  const triangles = solid.triangles.map(([a, b, c]) => `          <triangle v1="${a}" v2="${b}" v3="${c}"/>`);
  return `<?xml version="1.0" encoding="UTF-8"?>
<model unit="millimeter" xml:lang="en" xmlns="http://schemas.microsoft.com/3dmanufacturing/core/2015/02">
  <metadata name="Title">${escaped(title)}</metadata>
  <resources>
    <object id="1" type="model" name="${escaped(title)}">
      <mesh>
        <vertices>
${vertices.join('\n')}
        </vertices>
        <triangles>
${triangles.join('\n')}
        </triangles>
      </mesh>
    </object>
  </resources>
  <build>
    <item objectid="1"/>
  </build>
</model>
`;
}

const entities: Record<string, string> = { '&': '&amp;', '<': '&lt;', '>': '&gt;', '"': '&quot;' };
const escaped = (text: string) => text.replace(/[&<>"]/g, (character) => entities[character] ?? character);
