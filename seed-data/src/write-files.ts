/** Writes every file of the demo kits into a folder, to look at: `node dist/write-files.js <folder>`. */
import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { demoWorkshop } from './demo-workshop.js';
import { generateFiles } from './generate-files.js';

const folder = process.argv[2];
if (!folder) {
  console.error('Name the folder to write to: node dist/write-files.js <folder>');
  process.exit(1);
}
for (const kit of demoWorkshop.kits) {
  for (const revision of kit.revisions) {
    const into = join(folder, kit.slug, revision.label.replace(' ', '-').toLowerCase());
    await mkdir(into, { recursive: true });
    await Promise.all(
      generateFiles(kit, revision).map(({ fileName, bytes }) => writeFile(join(into, fileName), bytes)),
    );
  }
}
