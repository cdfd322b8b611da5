import { mkdirSync, mkdtempSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { areDependenciesCurrent } from './dependencies.mjs';

describe('knowing whether to install npm packages', () => {
  let root = '';
  beforeEach(() => {
    root = mkdtempSync(join(tmpdir(), 'windchest-packages-'));
    mkdirSync(join(root, 'node_modules'));
  });
  afterEach(() => rmSync(root, { recursive: true }));
  const lock = (file: string, packages: object) =>
    writeFileSync(join(root, file), JSON.stringify({ packages }));
  const wanted = {
    '': { name: 'windchest' },
    'packages/money': { version: '0.1.0' },
    'node_modules/zod': { version: '4.0.0' },
    'node_modules/other-system': { version: '1.0.0', optional: true },
    'node_modules/@windchest/money': { resolved: 'packages/money', link: true },
  };
  const installed = {
    'node_modules/zod': { version: '4.0.0' },
    'node_modules/@windchest/money': { resolved: 'packages/money', link: true },
  };

  it('installs when nothing is there', () => {
    lock('package-lock.json', wanted);
    expect(areDependenciesCurrent(root)).toBe(false);
  });

  it('accepts what somebody installed by hand, and remembers it', () => {
    lock('package-lock.json', wanted);
    lock('node_modules/.package-lock.json', installed);
    expect(areDependenciesCurrent(root)).toBe(true);
    rmSync(join(root, 'node_modules/.package-lock.json'));
    expect(areDependenciesCurrent(root)).toBe(true);
  });

  it('installs again when the lock file asks for another version or a new package', () => {
    lock('node_modules/.package-lock.json', installed);
    lock('package-lock.json', { ...wanted, 'node_modules/zod': { version: '4.0.1' } });
    expect(areDependenciesCurrent(root)).toBe(false);
    lock('package-lock.json', { ...wanted, 'node_modules/swr': { version: '2.0.0' } });
    expect(areDependenciesCurrent(root)).toBe(false);
  });
});
