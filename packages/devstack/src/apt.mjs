import { spawnSync } from 'node:child_process';
import { StandFailure } from './failures.mjs';
import { findProgram } from './paths.mjs';
import { step } from './report.mjs';

/**
 * @typedef {{ name: string, programs: string[], service?: string }} DebianPackage
 */

/** @type {DebianPackage} */
const mariadb = { name: 'mariadb-server', programs: ['mariadbd', 'mariadb-install-db'], service: 'mariadb' };
/** @type {DebianPackage} */
const chromium = { name: 'chromium', programs: ['chromium'] };
/** @type {DebianPackage} */
const poppler = { name: 'poppler-utils', programs: ['pdftotext'] };

export const PACKAGES_TO_RUN = Object.freeze([mariadb]);
export const PACKAGES_TO_TEST = Object.freeze([mariadb, chromium, poppler]);

/**
 * Installs what is missing. What is there already, from whatever source, is left alone.
 * @param {readonly DebianPackage[]} packages
 * @param {{ supervisor: import('./processes.mjs').Supervisor, logFile: string }} context
 */
export async function ensurePackages(packages, { supervisor, logFile }) {
  const missing = missingPackages(packages);
  if (missing.length === 0) return;
  const names = missing.map((debianPackage) => debianPackage.name);
  const prefix = rootPrefix();
  if (findProgram('apt-get') === undefined || prefix === undefined) {
    throw new StandFailure(needsSentence(missing));
  }
  await step(`Installing ${names.join(', ')} with apt-get`, async () => {
    const [command = 'sh', ...args] = [...prefix, 'sh', '-c', installScript(missing)];
    const code = await supervisor.run({ name: 'apt-get', command, args, logFile });
    if (code !== 0) {
      throw new StandFailure(`apt-get could not install ${names.join(', ')}.`, { logFile });
    }
  });
  const still = missingPackages(packages);
  if (still.length > 0) throw new StandFailure(needsSentence(still));
}

/**
 * @param {readonly DebianPackage[]} packages
 * @param {(program: string) => string | undefined} [find]
 */
export function missingPackages(packages, find = findProgram) {
  return packages.filter(({ programs }) => programs.some((program) => find(program) === undefined));
}

/**
 * A shell script for root. Debian starts a server when it installs one; the guard (policy-rc.d, the
 * distribution's own means) forbids that, and the service is switched off, for this start and the next ones.
 * `--no-remove` keeps a server of another make from being replaced.
 * @param {readonly DebianPackage[]} packages
 * @param {(debianPackage: DebianPackage) => boolean} [isWhollyMissing] a server that was there stays as it is
 */
export function installScript(packages, isWhollyMissing = ({ programs }) => !programs.some(findProgram)) {
  const services = packages.filter((each) => isWhollyMissing(each)).flatMap(({ service }) => service ?? []);
  return [
    'set -eu',
    'guard=/usr/sbin/policy-rc.d',
    'own_guard=no',
    `trap 'if [ "$own_guard" = yes ]; then rm -f "$guard"; fi' EXIT`,
    "trap 'exit 130' INT TERM HUP",
    `if [ ! -e "$guard" ]; then own_guard=yes; printf '#!/bin/sh\\nexit 101\\n' > "$guard"; chmod 755 "$guard"; fi`,
    'export DEBIAN_FRONTEND=noninteractive',
    'apt-get -o DPkg::Lock::Timeout=300 update',
    `apt-get -o DPkg::Lock::Timeout=300 install -y --no-install-recommends --no-remove ${packages
      .map(({ name }) => name)
      .join(' ')}`,
    ...services.map(
      (service) =>
        `if [ -d /run/systemd/system ]; then systemctl disable --now ${service} || true; ` +
        `elif [ -x /etc/init.d/${service} ]; then /etc/init.d/${service} stop || true; update-rc.d ${service} disable || true; fi`,
    ),
  ].join('\n');
}

/** @param {readonly DebianPackage[]} packages */
function needsSentence(packages) {
  const names = packages.map(({ name }) => name);
  const services = packages.flatMap(({ service }) => service ?? []);
  const what =
    names.length === 1 ? `the Debian package ${names[0]}` : `the Debian packages ${names.join(', ')}`;
  return (
    `Windchest needs ${what} and may not install it itself here. ` +
    `Run "sudo apt-get install --no-install-recommends ${names.join(' ')}" and try again.` +
    services
      .map(
        (service) =>
          ` Debian then starts a server that Windchest does not use; "sudo systemctl disable --now ${service}" stops it.`,
      )
      .join('')
  );
}

/** @returns {string[] | undefined} what to put before a command to run it as root */
function rootPrefix() {
  if (process.getuid?.() === 0) return [];
  if (findProgram('sudo') === undefined) return undefined;
  return spawnSync('sudo', ['-n', 'true'], { stdio: 'ignore' }).status === 0 ? ['sudo', '-n'] : undefined;
}
