import { spawn } from 'node:child_process';
import { mkdtempSync, readdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { processStatus } from './marked-processes.mjs';
import { refuseWhenRunning, runningPid, takeLock } from './lock.mjs';

const isRunning = (pid: number) => processStatus(pid)?.hasEnded === false;

describe('the lock of a stand', () => {
  let folder = '';
  beforeEach(() => {
    folder = mkdtempSync(join(tmpdir(), 'windchest-lock-'));
  });
  afterEach(() => rmSync(folder, { recursive: true }));

  it('lets one process in, and the next one when it has left', async () => {
    const release = await takeLock(folder, undefined);
    expect(runningPid(folder)).toBe(process.pid);
    await expect(takeLock(folder, undefined)).rejects.toThrow(
      `Windchest is running from this folder already (process ${process.pid}). Stop it`,
    );
    expect(() => refuseWhenRunning(folder, 'remove its data')).toThrow(/to remove its data\.$/);
    release();
    expect(readdirSync(folder)).toEqual([]);
    (await takeLock(folder, undefined))();
  });

  it('is not kept by a process that has ended, nor by another one that got its number', async () => {
    for (const holder of [
      { pid: 2 ** 22 + 1, bornAt: 'boot:1' },
      { pid: process.pid, bornAt: 'boot:1' },
      { pid: process.pid },
    ]) {
      writeFileSync(join(folder, 'running.json'), JSON.stringify({ command: holder }));
      expect(runningPid(folder)).toBeUndefined();
      (await takeLock(folder, undefined))();
    }
  });

  it('waits until the watchdog of a killed command has tidied up', async () => {
    const release = await takeLock(folder, undefined);
    const { command } = JSON.parse(readFileSync(join(folder, 'running.json'), 'utf8'));
    release();
    const watchdog = spawn('sleep', ['0.3']);
    const ended = new Promise((resolve) => watchdog.once('exit', resolve));
    const other = await takeLock(folder, watchdog.pid);
    const { watchdog: holder } = JSON.parse(readFileSync(join(folder, 'running.json'), 'utf8'));
    other();
    writeFileSync(
      join(folder, 'running.json'),
      JSON.stringify({ command: { ...command, pid: 2 ** 22 + 1 }, watchdog: holder }),
    );
    const next = await takeLock(folder, undefined);
    expect(isRunning(watchdog.pid ?? 0)).toBe(false);
    await ended;
    next();
  });

  it('is not kept by a file that was cut off', async () => {
    writeFileSync(join(folder, 'running.json'), '{"command":');
    (await takeLock(folder, undefined))();
  });
});
