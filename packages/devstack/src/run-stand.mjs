import { PACKAGES_TO_RUN } from './apt.mjs';
import { StandFailure } from './failures.mjs';
import { greet } from './greeting.mjs';
import { takeLock } from './lock.mjs';
import { homeFolder } from './paths.mjs';
import { prepareStand } from './prepare.mjs';
import { startStand } from './stand.mjs';
import { turnLogs } from './stand-data.mjs';
import { standPlaces } from './stand-environment.mjs';

/**
 * The body of `npm start` and `npm run dev`: prepares, starts, greets, and waits until something ends it.
 * @param {import('./processes.mjs').Supervisor} supervisor
 * @param {{ mode: 'start' | 'dev', onReady?: (stand: import('./stand.mjs').Stand) => void }} options
 * @returns {Promise<number>}
 */
export async function runStand(supervisor, { mode, onReady }) {
  const release = await takeLock(homeFolder, supervisor.watchdogPid);
  const { logs } = standPlaces(homeFolder);
  try {
    turnLogs(logs);
    await prepareStand({
      supervisor,
      packages: PACKAGES_TO_RUN,
      logs,
      webBuild: mode === 'dev' ? 'when-missing' : 'when-changed',
    });
    const stand = await startStand({ folder: homeFolder, mode, supervisor });
    await greet(stand);
    onReady?.(stand);
    const child = await Promise.race([supervisor.unexpectedEnd, supervisor.stopBegins]);
    if (child === undefined) return 0;
    const { code, signal } = await child.exited;
    throw new StandFailure(
      `${child.name} ended by itself (${signal ?? `code ${code}`}); everything else is stopped now.`,
      {
        logFile: child.logFile,
      },
    );
  } finally {
    // Only when all has stopped may the next start begin.
    await supervisor.stopAll();
    release();
  }
}
