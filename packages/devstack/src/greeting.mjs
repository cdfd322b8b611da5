import { existsSync } from 'node:fs';
import { join, relative } from 'node:path';
import { pathToFileURL } from 'node:url';
import { projectRoot } from './paths.mjs';
import { columns, say } from './report.mjs';

/**
 * @param {import('./stand.mjs').Stand} stand
 */
export async function greet({ addresses, logs }) {
  say(`\nWindchest is ready: ${addresses.shop}\n`);
  const signIns = await readSignIns();
  if (signIns.length > 0) {
    say('Sign in as');
    const rows = signIns.map(({ role, email, passphrase }) => [`  ${role}`, email, passphrase]);
    for (const line of columns(rows)) say(line);
    say();
  }
  const places = [
    ['Mails sent by the shop', addresses.mail],
    ['Payment stand-in', addresses.stripe],
    ['Logs', relative(process.cwd(), logs) || logs],
  ];
  for (const line of columns(places)) say(line);
  say('\nCtrl-C stops everything. The data stays; "npm run reset" removes it.');
}

/** @returns {Promise<{ role: string, email: string, passphrase: string }[]>} */
async function readSignIns() {
  const file = join(projectRoot, 'seed-data/dist/sign-ins.js');
  if (!existsSync(file)) return [];
  const { demoSignIns } = await import(pathToFileURL(file).href);
  return demoSignIns;
}
