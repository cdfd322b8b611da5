import { mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { join } from 'node:path';
import { StandFailure } from './failures.mjs';

/** Where each server prefers to listen; all on the loopback address only. */
export const PREFERRED_PORTS = Object.freeze({
  shop: 4600,
  api: 4610,
  database: 4620,
  stripe: 4630,
  mailWeb: 4640,
  mailSmtp: 4650,
});

/** @typedef {Record<keyof typeof PREFERRED_PORTS, number>} Ports */
/** @typedef {(port: number) => Promise<boolean>} IsFree */

/**
 * The ports of the last run where they are free, else the next free ones.
 * @param {string} folder
 * @param {{ shopPort?: number, isFree?: IsFree }} [options]
 * @returns {Promise<Ports>}
 */
export async function keptPorts(folder, { shopPort, isFree = isPortFree } = {}) {
  const wanted = { ...PREFERRED_PORTS, ...readPorts(folder), ...(shopPort && { shop: shopPort }) };
  /** @type {Ports} */
  const ports = { ...wanted };
  /** @type {Set<number>} */
  const taken = new Set();
  for (const name of portNames()) {
    ports[name] = await nextFree(wanted[name], taken, isFree);
    taken.add(ports[name]);
  }
  mkdirSync(folder, { recursive: true });
  writeFileSync(join(folder, 'ports.json'), `${JSON.stringify(ports, null, 2)}\n`);
  return ports;
}

/**
 * Ports for a stand that is thrown away, below the range from which the system takes ports for outgoing
 * connections (32768 and up on Linux), so that none is taken between choosing and listening.
 * @returns {Promise<Ports>}
 */
export async function randomPorts() {
  /** @type {Ports} */
  const ports = { ...PREFERRED_PORTS };
  /** @type {Set<number>} */
  const taken = new Set();
  for (const name of portNames()) {
    ports[name] = await randomPort(taken);
    taken.add(ports[name]);
  }
  return ports;
}

/** @param {Set<number>} [taken] */
export async function randomPort(taken = new Set()) {
  return nextFree(20_000 + Math.floor(Math.random() * 10_000), taken, isPortFree);
}

/**
 * @param {string | undefined} text the value of WINDCHEST_PORT
 * @returns {number | undefined}
 */
export function readShopPort(text) {
  if (text === undefined || text === '') return undefined;
  const port = Number(text);
  if (!Number.isInteger(port) || port < 1024 || port > 65_535) {
    throw new StandFailure(`WINDCHEST_PORT is "${text}"; give a port number from 1024 to 65535.`);
  }
  return port;
}

/** @type {IsFree} */
export function isPortFree(port) {
  return new Promise((resolve) => {
    const server = createServer();
    server.once('error', () => resolve(false));
    server.listen({ port, host: '127.0.0.1', exclusive: true }, () => server.close(() => resolve(true)));
  });
}

/** @param {number} first @param {Set<number>} taken @param {IsFree} isFree */
async function nextFree(first, taken, isFree) {
  for (let port = first; port < first + 2_000 && port <= 65_535; port += 1) {
    if (!taken.has(port) && (await isFree(port))) return port;
  }
  throw new StandFailure(`No free port was found from ${first} upwards. Set WINDCHEST_PORT to a free one.`);
}

/** @param {string} folder */
function readPorts(folder) {
  try {
    const kept = JSON.parse(readFileSync(join(folder, 'ports.json'), 'utf8'));
    return Object.fromEntries(
      portNames().flatMap((name) => (isPort(kept[name]) ? [[name, kept[name]]] : [])),
    );
  } catch {
    return {};
  }
}

/** @param {unknown} value */
const isPort = (value) => Number.isInteger(value) && Number(value) > 0 && Number(value) <= 65_535;

const portNames = () => /** @type {(keyof Ports)[]} */ (Object.keys(PREFERRED_PORTS));
