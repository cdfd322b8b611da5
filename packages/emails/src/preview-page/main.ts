/// <reference types="node" />
import { mkdir, writeFile } from 'node:fs/promises';
import { join } from 'node:path';
import { previewPage } from './preview-page.js';

const folder = process.argv[2];
if (folder === undefined) {
  process.stderr.write(
    'Name the folder to write to: npx tsx packages/emails/src/preview-page/main.ts FOLDER\n',
  );
  process.exit(1);
}
await mkdir(folder, { recursive: true });
const path = join(folder, 'emails.html');
await writeFile(path, previewPage());
process.stdout.write(`Wrote ${path}\n`);
