import { mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { createServer, type AddressInfo } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { isPortFree, keptPorts, PREFERRED_PORTS, randomPorts, readShopPort } from './ports.mjs';

describe('choosing ports', () => {
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'windchest-ports-'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));
  const allFreeBut = (busy: number[]) => (port: number) => Promise.resolve(!busy.includes(port));

  it('takes the preferred ports when they are free', async () => {
    await expect(keptPorts(folder, { isFree: allFreeBut([]) })).resolves.toEqual(PREFERRED_PORTS);
  });

  it('takes the next free port when one is busy, and keeps it for the next run', async () => {
    const first = await keptPorts(folder, { isFree: allFreeBut([4600, 4601]) });
    expect(first.shop).toBe(4602);
    await expect(keptPorts(folder, { isFree: allFreeBut([]) })).resolves.toEqual(first);
    expect(JSON.parse(readFileSync(join(folder, 'ports.json'), 'utf8'))).toEqual(first);
  });

  it('gives no port to two servers', async () => {
    const ports = await keptPorts(folder, { shopPort: 4620, isFree: allFreeBut([]) });
    expect(ports.shop).toBe(4620);
    expect(new Set(Object.values(ports)).size).toBe(6);
  });

  it('prefers the port asked for over the kept one', async () => {
    await keptPorts(folder, { isFree: allFreeBut([]) });
    await expect(keptPorts(folder, { shopPort: 9000, isFree: allFreeBut([]) })).resolves.toMatchObject({
      shop: 9000,
    });
  });

  it('sees that a port is in use', async () => {
    const server = createServer();
    await new Promise<void>((resolve) => server.listen(0, '127.0.0.1', resolve));
    const { port } = server.address() as AddressInfo;
    await expect(isPortFree(port)).resolves.toBe(false);
    await new Promise((resolve) => server.close(resolve));
    await expect(isPortFree(port)).resolves.toBe(true);
  });

  it('keeps throwaway stands out of the range of outgoing connections', async () => {
    const ports = Object.values(await randomPorts());
    expect(new Set(ports).size).toBe(6);
    expect(Math.max(...ports)).toBeLessThan(32_768);
  });

  it('refuses a port that is none, naming the variable', () => {
    expect(readShopPort(undefined)).toBeUndefined();
    expect(readShopPort('4700')).toBe(4700);
    for (const bad of ['80', 'many', '70000', '46.5'])
      expect(() => readShopPort(bad)).toThrow(/WINDCHEST_PORT/);
  });
});
