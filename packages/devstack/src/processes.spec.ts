import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { createSupervisor } from './processes.mjs';
import { findMarked, processStatus } from './marked-processes.mjs';

const isAlive = (pid: number): boolean => processStatus(pid)?.hasEnded === false;
const until = async (condition: () => boolean): Promise<void> => {
  while (!condition()) await new Promise((resolve) => setTimeout(resolve, 20));
};

describe('a supervisor', () => {
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'windchest-supervisor-'));
  });
  afterEach(() => rmSync(folder, { recursive: true, force: true }));

  const script = (name: string, source: string) => ({
    name,
    command: process.execPath,
    args: ['-e', source],
    logFile: join(folder, `${name}.log`),
  });
  const orderly = (name: string) =>
    script(
      name,
      `require('fs').appendFileSync(${JSON.stringify(join(folder, 'order'))}, '');
       process.on('SIGTERM', () => {
         require('fs').appendFileSync(${JSON.stringify(join(folder, 'order'))}, '${name} ');
         process.exit(0);
       });
       setInterval(() => {}, 1000); console.log('ready');`,
    );
  const isReady = (name: string) => () => readFileSync(join(folder, `${name}.log`), 'utf8').includes('ready');

  it('stops what it started, the newest first', async () => {
    const supervisor = createSupervisor();
    for (const name of ['database', 'stand-in', 'shop']) {
      const child = supervisor.start(orderly(name));
      await supervisor.waitUntilReady(child, isReady(name), 10_000);
    }
    await supervisor.stopAll();
    expect(readFileSync(join(folder, 'order'), 'utf8')).toBe('shop stand-in database ');
  });

  it('ends a process that does not listen when its time is over', async () => {
    const supervisor = createSupervisor();
    const child = supervisor.start({
      ...script(
        'deaf',
        `process.on('SIGTERM', () => {}); setInterval(() => {}, 1000); console.log('ready');`,
      ),
      stopGraceMs: 100,
    });
    await supervisor.waitUntilReady(child, isReady('deaf'), 10_000);
    await supervisor.stopAll();
    await expect(child.exited).resolves.toEqual({ code: null, signal: 'SIGKILL' });
  });

  it('ends grandchildren too, even those in a process group of their own', async () => {
    const supervisor = createSupervisor();
    const child = supervisor.start(
      script(
        'browser',
        `const inner = require('child_process').spawn(process.execPath, ['-e', 'setInterval(() => {}, 1000)'], { detached: true, stdio: 'ignore' });
         setInterval(() => {}, 1000); console.log('ready ' + inner.pid);`,
      ),
    );
    await supervisor.waitUntilReady(child, isReady('browser'), 10_000);
    const inner = Number(readFileSync(child.logFile, 'utf8').split(' ')[1]);
    expect(isAlive(inner)).toBe(true);
    await supervisor.stopAll();
    await until(() => !isAlive(inner));
  });

  it('says which process ended before it was ready, and where its log is', async () => {
    const supervisor = createSupervisor();
    const child = supervisor.start(script('shop', `console.log('no database'); process.exit(3)`));
    await expect(supervisor.waitUntilReady(child, () => false, 10_000)).rejects.toMatchObject({
      message: 'shop ended before it was ready.',
      logFile: join(folder, 'shop.log'),
    });
    await supervisor.stopAll();
  });

  it('gives the exit code of a step, and starts nothing once it is stopping', async () => {
    const supervisor = createSupervisor();
    await expect(supervisor.run(script('step', 'process.exit(7)'))).resolves.toBe(7);
    await expect(supervisor.run({ ...script('none', ''), command: '/no/such/program' })).resolves.toBe(127);
    await supervisor.stopAll();
    expect(() => supervisor.start(script('late', ''))).toThrow('Stopped before it was done.');
  });

  it('leaves nothing behind when the command itself is killed', async () => {
    const temporary = join(folder, 'temporary');
    const source = `
      import { mkdirSync } from 'node:fs';
      import { createSupervisor } from ${JSON.stringify(fileURLToPath(new URL('processes.mjs', import.meta.url)))};
      const supervisor = createSupervisor();
      mkdirSync(${JSON.stringify(temporary)});
      supervisor.removeAtEnd(${JSON.stringify(temporary)});
      const child = supervisor.start(${JSON.stringify(script('server', 'setInterval(() => {}, 1000)'))});
      console.log(child.pid);`;
    const command = spawn(process.execPath, ['--input-type=module', '-e', source], {
      stdio: ['ignore', 'pipe', 'inherit'],
    });
    const [bytes] = await new Promise<Buffer[]>((resolve) =>
      command.stdout.once('data', (data: Buffer) => resolve([data])),
    );
    const server = Number(bytes);
    expect(isAlive(server)).toBe(true);
    command.kill('SIGKILL');
    await until(() => !isAlive(server));
    await until(() => !existsSync(temporary));
  });

  it('knows no processes of a run that never was', () => {
    expect(findMarked('no-such-run')).toEqual([]);
  });
});
