import { spawn } from 'node:child_process';
import { fileURLToPath } from 'node:url';
import { people } from '../people.js';
import { demoSignIns } from '../sign-ins.js';

const command = fileURLToPath(new URL('../../../apps/api/dist/commands/create-people.js', import.meta.url));

/** The demo people, by the command an operator uses for the first owner. */
export const makePeople = async (variables: Record<string, string | undefined>): Promise<void> => {
  const unused = 'not used by this command 0123456789';
  const child = spawn(process.execPath, [command], {
    stdio: ['pipe', 'inherit', 'inherit'],
    env: {
      ...process.env,
      NODE_ENV: 'production',
      BASE_URL: variables['WINDCHEST_URL'],
      FILES_DIR: variables['WINDCHEST_FILES_DIR'],
      DB_HOST: variables['WINDCHEST_DB_HOST'],
      DB_PORT: variables['WINDCHEST_DB_PORT'],
      DB_NAME: variables['WINDCHEST_DB_NAME'],
      DB_USER: variables['WINDCHEST_DB_USER'],
      DB_PASSWORD: variables['WINDCHEST_DB_PASSWORD'],
      SESSION_SECRET: unused,
      LINK_SECRET: unused,
      SMTP_URL: 'smtp://127.0.0.1:1',
      MAIL_FROM: 'not used',
      STRIPE_KEY: unused,
      STRIPE_WEBHOOK_SECRET: unused,
    },
  });
  const lines = people.map(({ email, name, role, isVerified }) => {
    const passphrase = demoSignIns.find((one) => one.email === email)?.passphrase;
    return JSON.stringify({ email, name, role, isVerified, passphrase });
  });
  child.stdin.end(lines.join('\n'));
  const code = await new Promise<number | null>((resolve, reject) =>
    child.once('exit', resolve).once('error', reject),
  );
  if (code !== 0) throw new Error('The demo people could not be made.');
};
