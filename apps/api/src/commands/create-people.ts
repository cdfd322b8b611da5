import 'reflect-metadata';
import { text } from 'node:stream/consumers';
import { NestFactory } from '@nestjs/core';
import { getConnectionToken } from '@nestjs/sequelize';
import { email, passphrase, roles } from '@windchest/contracts';
import type { Sequelize } from 'sequelize';
import { z } from 'zod';
import { Passphrases } from '../accounts/passphrases.js';
import { People } from '../accounts/people.js';
import { AppModule } from '../app.module.js';
import { migrate } from '../database/migrate.js';
import { Transactions } from '../database/transactions.js';

const wish = z.object({
  email,
  name: z.string().min(1).max(80),
  role: z.enum(roles),
  passphrase,
  isVerified: z.boolean().default(true),
});

/**
 * Makes people directly: the first owner of a new installation, say. Reads one JSON object a line from
 * standard input: `{"email": …, "name": …, "role": "owner", "passphrase": …}`. Who is there already
 * stays as they are.
 */
const main = async (): Promise<void> => {
  const lines = (await text(process.stdin)).split('\n').filter((one) => one.trim() !== '');
  const wishes = lines.map((one, index) => {
    const parsed = wish.safeParse(JSON.parse(one));
    if (parsed.success) return parsed.data;
    throw new Error(
      `Line ${index + 1}: ${parsed.error.issues.map((issue) => `${issue.path.join('.')}: ${issue.message}`).join('; ')}`,
    );
  });
  process.env['JOB_CONCURRENCY'] = '0';
  const app = await NestFactory.createApplicationContext(AppModule, {
    logger: ['error'],
    abortOnError: false,
  });
  await migrate(app.get<Sequelize>(getConnectionToken()));
  const people = app.get(People, { strict: false });
  const passphrases = app.get(Passphrases, { strict: false });
  for (const one of wishes) {
    passphrases.check(one.passphrase, one);
    const passphraseHash = await passphrases.hash(one.passphrase);
    const made = await app.get(Transactions, { strict: false }).run(async (tx) => {
      if (await people.byEmail(one.email, tx)) return false;
      const person = await people.create(tx, {
        email: one.email,
        name: one.name,
        role: one.role,
        passphraseHash,
      });
      if (one.isVerified) await people.verify(tx, person);
      return true;
    });
    process.stdout.write(`${made ? 'made' : 'there already'}: ${one.role} ${one.email}\n`);
  }
  await app.close();
};

main().catch((fault: unknown) => {
  console.error(fault instanceof Error ? fault.message : fault);
  process.exit(1);
});
