import { Interrupted, StandFailure } from './failures.mjs';
import { createSupervisor } from './processes.mjs';
import { say, sayFailure } from './report.mjs';

/**
 * The frame around every command: whatever way it ends (done, failed, Ctrl-C, closed terminal, dead parent)
 * everything it started is stopped before it ends.
 * @param {(supervisor: import('./processes.mjs').Supervisor) => Promise<number>} body gives the exit code
 * @param {{ codeWhenInterrupted?: number }} [options]
 */
export async function runCommand(body, { codeWhenInterrupted = 130 } = {}) {
  checkNodeVersion();
  const supervisor = createSupervisor();
  let isInterrupted = false;
  /** @param {string} reason */
  const interrupt = (reason) => {
    // A terminal and npm both send the signal: the second one must not cut the stopping short.
    if (supervisor.isStopping()) return;
    isInterrupted = true;
    say(`\n${reason}: stopping everything.`);
    void supervisor.stopAll();
  };
  process.on('SIGINT', () => interrupt('Interrupted'));
  process.on('SIGTERM', () => interrupt('Told to stop'));
  process.on('SIGHUP', () => interrupt('The terminal has gone'));
  // A reader that goes away (`npm start | head`) is like a closed terminal; there is nobody left to tell.
  process.stdout.on('error', () => void supervisor.stopAll());
  process.on('uncaughtException', (error) => {
    process.exitCode = 1;
    sayFailure(error);
    void supervisor.stopAll().then(() => process.exit(1));
  });
  const parent = process.ppid;
  const parentCheck = setInterval(() => {
    if (process.ppid !== parent) interrupt('The calling process has gone');
  }, 500);
  parentCheck.unref();

  let code = 1;
  try {
    code = await body(supervisor);
  } catch (error) {
    if (!(error instanceof Interrupted)) sayFailure(error);
  }
  await supervisor.stopAll();
  process.exit(isInterrupted ? codeWhenInterrupted : code);
}

function checkNodeVersion() {
  const [major = 0, minor = 0] = process.versions.node.split('.').map(Number);
  if (major < 20 || (major === 20 && minor < 19)) {
    const failure = new StandFailure(
      `Windchest needs Node 20.19 or a later Node 20; this is ${process.version}. Install it and try again.`,
    );
    sayFailure(failure);
    process.exit(1);
  }
}
