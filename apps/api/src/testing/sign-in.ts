import { randomUUID } from 'node:crypto';
import type { Role } from '@windchest/contracts';
import { Passphrases } from '../accounts/passphrases.js';
import { People } from '../accounts/people.js';
import { Transactions } from '../database/transactions.js';
import type { Browser, TestApp } from './test-app.js';

export const TEST_PASSPHRASE = 'the tide was out by nine';
let hash: Promise<string> | undefined;

/** A person with a verified address, made directly. */
export const makePerson = async (
  shop: TestApp,
  role: Role,
  email = `${role}-${randomUUID().slice(0, 8)}@mail.example`,
  isVerified = true,
): Promise<{ id: string; email: string }> => {
  const people = shop.app.get(People, { strict: false });
  hash ??= shop.app.get(Passphrases, { strict: false }).hash(TEST_PASSPHRASE);
  const passphraseHash = await hash;
  return shop.app.get(Transactions, { strict: false }).run(async (tx) => {
    const person = await people.create(tx, { email, name: `Test ${role}`, role, passphraseHash });
    if (isVerified) await people.verify(tx, person);
    return { id: person.id, email };
  });
};

/** A browser signed in as somebody of this role. */
export const signInAs = async (shop: TestApp, role: Role, email?: string): Promise<Browser> => {
  const person = await makePerson(shop, role, email);
  const browser = shop.browser();
  await browser.post('/api/session').send({ email: person.email, passphrase: TEST_PASSPHRASE }).expect(200);
  return browser;
};
