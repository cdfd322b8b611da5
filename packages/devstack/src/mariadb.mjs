import { spawnSync } from 'node:child_process';
import { chownSync, existsSync, mkdirSync, renameSync, rmSync, statSync, writeFileSync } from 'node:fs';
import { connect } from 'node:net';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { StandFailure } from './failures.mjs';
import { findProgram } from './paths.mjs';

/** @typedef {import('./processes.mjs').Supervisor} Supervisor */
/** @typedef {{ host: string, port: number, name: string, user: string, password: string }} DatabaseAddress */
/**
 * @typedef {object} ServerWish
 * @property {Supervisor} supervisor
 * @property {string} folder
 * @property {number} port
 * @property {string} logFile
 * @property {{ databasePassword: string, databaseRootPassword: string }} secrets
 * @property {boolean} isDurable false only for data that is thrown away: a crash may lose the last second
 * @property {boolean} [mayMakeDatabases] the app's user may create and drop databases (tests)
 */

const SQL_MODE = [
  'STRICT_TRANS_TABLES',
  'ERROR_FOR_DIVISION_BY_ZERO',
  'NO_ENGINE_SUBSTITUTION',
  'NO_ZERO_DATE',
  'NO_ZERO_IN_DATE',
  'ONLY_FULL_GROUP_BY',
].join(',');

const NAME = 'windchest';
/** A longer address of a Unix socket is refused by Linux (sun_path, unix(7)). */
const SOCKET_PATH_BYTES = 107;

/**
 * Starts a MariaDB of the stand's own in its folder, on the loopback address, making database and user at
 * the first start.
 * @param {ServerWish} wish
 * @returns {Promise<DatabaseAddress>}
 */
export async function startMariadb(wish) {
  const { supervisor, folder, port, secrets, logFile } = wish;
  const data = join(folder, 'data');
  const run = join(folder, 'run');
  mkdirSync(folder, { recursive: true, mode: 0o755 });
  const user = serverUser(folder, data);
  makeOwned(run, user);
  if (!existsSync(data)) await installData({ ...wish, data, user });

  const setup = join(run, 'setup.sql');
  rmSync(setup, { force: true });
  writeFileSync(setup, setupSql(secrets, wish.mayMakeDatabases ?? false), { mode: 0o600 });
  giveTo(setup, user);
  const socket = socketPath(run, port);
  const server = supervisor.start({
    name: 'MariaDB',
    command: program('mariadbd'),
    args: serverFlags({ data, run, socket, port, setup, user: user?.name, isDurable: wish.isDurable }),
    logFile,
    stopGraceMs: 30_000,
  });
  try {
    await supervisor.waitUntilReady(server, () => answersAsMariadb(port), 60_000);
  } finally {
    // It holds the passwords, and is read before the first connection is let in.
    rmSync(setup, { force: true });
  }
  return { host: '127.0.0.1', port, name: NAME, user: NAME, password: secrets.databasePassword };
}

/**
 * @param {{ data: string, run: string, socket: string, port: number, setup: string, user?: string, isDurable: boolean }} options
 */
export function serverFlags({ data, run, socket, port, setup, user, isDurable }) {
  return [
    // First, as MariaDB demands: the system's own settings must not leak in.
    '--no-defaults',
    `--datadir=${data}`,
    `--tmpdir=${run}`,
    `--socket=${socket}`,
    `--pid-file=${join(run, 'mariadbd.pid')}`,
    `--port=${port}`,
    '--bind-address=127.0.0.1',
    '--skip-name-resolve',
    '--skip-log-bin',
    '--local-infile=OFF',
    '--max-connections=300',
    '--character-set-server=utf8mb4',
    '--collation-server=utf8mb4_unicode_ci',
    '--default-time-zone=+00:00',
    `--sql-mode=${SQL_MODE}`,
    '--innodb-snapshot-isolation=ON',
    `--innodb-flush-log-at-trx-commit=${isDurable ? 1 : 2}`,
    '--innodb-buffer-pool-size=256M',
    `--init-file=${setup}`,
    ...(user === undefined ? [] : [`--user=${user}`]),
  ];
}

/**
 * Run at every start, so that a lost secrets file mends itself. One statement a line, as init-file wants it.
 * @param {{ databasePassword: string, databaseRootPassword: string }} secrets made of hex digits, nothing to quote
 * @param {boolean} mayMakeDatabases
 */
function setupSql({ databasePassword, databaseRootPassword }, mayMakeDatabases) {
  const account = `'${NAME}'@'127.0.0.1'`;
  return `${[
    // A new server lets anybody on the machine in as root.
    "DELETE FROM mysql.global_priv WHERE User = '' OR (User = 'root' AND Host <> 'localhost');",
    'FLUSH PRIVILEGES;',
    `ALTER USER 'root'@'localhost' IDENTIFIED BY '${databaseRootPassword}';`,
    `CREATE DATABASE IF NOT EXISTS ${NAME} CHARACTER SET utf8mb4 COLLATE utf8mb4_unicode_ci;`,
    `CREATE USER IF NOT EXISTS ${account} IDENTIFIED BY '${databasePassword}';`,
    `ALTER USER ${account} IDENTIFIED BY '${databasePassword}';`,
    `GRANT ALL PRIVILEGES ON ${mayMakeDatabases ? '*' : NAME}.* TO ${account};`,
  ].join('\n')}\n`;
}

/**
 * Filled beside its place and moved there whole: a broken-off first start leaves no half database.
 * @param {ServerWish & { data: string, user: ServerUser | undefined }} wish
 */
async function installData({ supervisor, folder, data, user, logFile }) {
  const fresh = join(folder, 'data.new');
  rmSync(fresh, { recursive: true, force: true });
  makeOwned(fresh, user);
  const code = await supervisor.run({
    name: 'mariadb-install-db',
    command: program('mariadb-install-db'),
    args: [
      '--no-defaults',
      `--datadir=${fresh}`,
      '--auth-root-authentication-method=normal',
      '--skip-test-db',
      ...(user === undefined ? [] : [`--user=${user.name}`]),
    ],
    logFile,
  });
  if (code !== 0) throw new StandFailure('MariaDB could not set up its data folder.', { logFile });
  renameSync(fresh, data);
}

/** @typedef {{ name: string, uid: number, gid: number }} ServerUser */

/**
 * MariaDB refuses to run as root unless told to. It gets the package's own user where that one can reach
 * the folder (it cannot in a closed home such as /root), else root.
 * @param {string} folder
 * @param {string} data
 * @returns {ServerUser | undefined} undefined when not root: it runs as whoever calls
 */
function serverUser(folder, data) {
  if (process.getuid?.() !== 0) return undefined;
  const root = { name: 'root', uid: 0, gid: 0 };
  const uid = idOf('-u');
  const gid = idOf('-g');
  if (uid === undefined || gid === undefined) return root;
  if (existsSync(data)) return statSync(data).uid === uid ? { name: 'mysql', uid, gid } : root;
  const reaches = spawnSync('runuser', ['-u', 'mysql', '--', 'test', '-x', folder], { stdio: 'ignore' });
  return reaches.status === 0 ? { name: 'mysql', uid, gid } : root;
}

/** @param {string} flag */
function idOf(flag) {
  const { status, stdout } = spawnSync('id', [flag, 'mysql'], { encoding: 'utf8' });
  return status === 0 ? Number(stdout) : undefined;
}

/** @param {string} folder @param {ServerUser | undefined} user */
function makeOwned(folder, user) {
  mkdirSync(folder, { recursive: true, mode: 0o700 });
  giveTo(folder, user);
}

/** @param {string} path @param {ServerUser | undefined} user */
function giveTo(path, user) {
  if (user !== undefined) chownSync(path, user.uid, user.gid);
}

/** @param {string} run @param {number} port */
function socketPath(run, port) {
  const path = join(run, 'mariadb.sock');
  return Buffer.byteLength(path) <= SOCKET_PATH_BYTES ? path : join(tmpdir(), `windchest-${port}.sock`);
}

/** @param {string} name */
function program(name) {
  const path = findProgram(name);
  if (path === undefined) {
    throw new StandFailure(`${name} was not found. Install the Debian package mariadb-server and try again.`);
  }
  return path;
}

/**
 * The port is open before the server lets anybody in; its greeting (protocol version 10) comes after.
 * @param {number} port
 * @returns {Promise<boolean>}
 */
function answersAsMariadb(port) {
  return new Promise((resolve) => {
    const socket = connect({ port, host: '127.0.0.1', timeout: 5_000 });
    /** @param {boolean} answer */
    const end = (answer) => {
      socket.destroy();
      resolve(answer);
    };
    socket.once('data', (bytes) => end(bytes[4] === 10));
    socket.once('timeout', () => end(false));
    socket.once('error', () => end(false));
    socket.once('close', () => end(false));
  });
}
