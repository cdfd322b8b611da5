import { readFileSync } from 'node:fs';
import { fileURLToPath } from 'node:url';
import { gzipSync } from 'node:zlib';

/**
 * What a first visit of the shop's front page loads in JavaScript, gzipped: the entry, the page's own lazy
 * chunk, and all that either imports. Run after `vite build`; fails above the budget.
 */
const budgetBytes = 130_000;
const homePage = 'src/features/store/home.page.tsx';
const dist = fileURLToPath(new URL('../dist/', import.meta.url));

const manifest = JSON.parse(readFileSync(`${dist}.vite/manifest.json`, 'utf8'));
if (!manifest[homePage]) {
  console.error(
    `The build has no chunk of ${homePage}. Is the page's route lazy, and is its file still there?`,
  );
  process.exit(1);
}

const files = new Set();
const collect = (name) => {
  const chunk = manifest[name];
  if (files.has(chunk.file)) return;
  files.add(chunk.file);
  for (const imported of chunk.imports ?? []) collect(imported);
};
collect('index.html');
collect(homePage);

const kilobytes = (bytes) => `${(bytes / 1000).toFixed(1).padStart(7)} kB`;
let total = 0;
for (const file of files) {
  const bytes = gzipSync(readFileSync(dist + file), { level: 6 }).length;
  total += bytes;
  process.stdout.write(`${kilobytes(bytes)}  ${file}\n`);
}
process.stdout.write(`${kilobytes(total)}  in all, of ${(budgetBytes / 1000).toFixed(0)} kB\n`);
if (total > budgetBytes) {
  console.error(`The first load is ${kilobytes(total - budgetBytes).trim()} over its budget.`);
  process.exit(1);
}
