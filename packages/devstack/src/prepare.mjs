import { join } from 'node:path';
import { ensurePackages } from './apt.mjs';
import { ensureServerBuild, ensureWebBuild, hasWebBuild } from './build.mjs';
import { ensureDependencies } from './dependencies.mjs';

/**
 * From a bare clone to built files; quick when nothing is missing and nothing has changed.
 * @param {{
 *   supervisor: import('./processes.mjs').Supervisor,
 *   packages: Parameters<typeof ensurePackages>[0],
 *   logs: string,
 *   webBuild?: 'when-changed' | 'when-missing',
 * }} options
 */
export async function prepareStand({ supervisor, packages, logs, webBuild = 'when-changed' }) {
  await ensurePackages(packages, { supervisor, logFile: join(logs, 'apt.log') });
  await ensureDependencies({ supervisor, logFile: join(logs, 'npm.log') });
  await ensureServerBuild({ supervisor, logFile: join(logs, 'build-server.log') });
  if (webBuild === 'when-changed' || !hasWebBuild()) {
    await ensureWebBuild({ supervisor, logFile: join(logs, 'build-web.log') });
  }
}
