import { existsSync, mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { dirname, join } from 'node:path';
import { fingerprint, removeOutdated } from './build.mjs';

describe('knowing whether to build', () => {
  let root = '';
  const write = (file: string, text = 'x') => {
    mkdirSync(dirname(join(root, file)), { recursive: true });
    writeFileSync(join(root, file), text);
  };
  beforeEach(() => {
    root = mkdtempSync(join(tmpdir(), 'windchest-build-'));
    write('tsconfig.json');
    write('packages/money/src/index.ts');
    write('packages/voicing/src/index.ts');
  });
  afterEach(() => rmSync(root, { recursive: true }));
  const hash = () => fingerprint(root, ['packages', 'apps/api']).hash;

  it('sees a changed, a new and a removed source, and a changed compiler setting', () => {
    const seen = [hash()];
    write('packages/money/src/index.ts', 'longer');
    seen.push(hash());
    write('packages/money/src/rounding.ts');
    seen.push(hash());
    rmSync(join(root, 'packages/voicing/src/index.ts'));
    seen.push(hash());
    write('tsconfig.json', 'longer');
    seen.push(hash());
    expect(new Set(seen).size).toBe(5);
  });

  it('does not mind built files, packages and tests', () => {
    const before = hash();
    write('packages/money/dist/index.js');
    write('packages/money/node_modules/x/index.js');
    write('packages/money/src/index.spec.ts');
    expect(hash()).toBe(before);
  });

  it('clears the built files of a workspace that lost a source, and of no other', () => {
    write('packages/money/dist/index.js');
    write('packages/voicing/dist/index.js');
    const before = fingerprint(root, ['packages']).files;
    rmSync(join(root, 'packages/money/src/index.ts'));
    removeOutdated(root, before, fingerprint(root, ['packages']).files);
    expect(existsSync(join(root, 'packages/money/dist'))).toBe(false);
    expect(existsSync(join(root, 'packages/voicing/dist'))).toBe(true);
  });
});
