import { randomBytes } from 'node:crypto';
import { chmodSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';

/** @typedef {ReturnType<typeof makeSecrets>} Secrets */

const hex = () => randomBytes(32).toString('hex');

/** Secrets of one stand, of no use anywhere else. The payment key only opens the local stand-in. */
export function makeSecrets() {
  return {
    sessionSecret: hex(),
    linkSecret: hex(),
    stripeKey: `sk_test_local${randomBytes(16).toString('hex')}`,
    stripeWebhookSecret: `whsec_${hex()}`,
    databasePassword: hex(),
    databaseRootPassword: hex(),
  };
}

/**
 * Kept from run to run, so that sessions and links stay valid. Only its owner may read the file.
 * @param {string} folder
 * @returns {Secrets}
 */
export function keptSecrets(folder) {
  mkdirSync(folder, { recursive: true });
  const file = join(folder, 'secrets.json');
  const secrets = { ...makeSecrets(), ...readKept(file) };
  writeFileSync(file, `${JSON.stringify(secrets, null, 2)}\n`, { mode: 0o600 });
  // The mode above only counts for a new file.
  chmodSync(file, 0o600);
  return secrets;
}

/** @param {string} file @returns {Partial<Secrets>} */
function readKept(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return {};
  }
}
