import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';
import { createTransport } from 'nodemailer';

type Kept = { subject: string; text: string; html: string; to: { address: string }[] };
type Ready = { ready: boolean; url: string; smtpPort: number };

const main = fileURLToPath(new URL('main.ts', import.meta.url));

// In a process of its own, as in development: the test runner cannot load maildev's web server, which
// calls for ES modules by `require`.
describe('the mail stand-in', () => {
  let folder: string;
  let child: ChildProcess;
  let mail: Ready;

  async function start(environment: Record<string, string>): Promise<void> {
    child = spawn(process.execPath, ['--import', 'tsx', main], {
      env: { ...process.env, ...environment },
      stdio: ['ignore', 'pipe', 'pipe'],
    });
    if (!child.stdout) throw new Error('The process has no output to read.');
    const [line] = (await once(createInterface(child.stdout), 'line')) as [string];
    mail = JSON.parse(line) as Ready;
  }
  async function stop(): Promise<number | null> {
    if (child.exitCode !== null) return child.exitCode;
    const ended = once(child, 'exit');
    child.kill('SIGTERM');
    return ((await ended) as [number | null])[0];
  }
  const send = () =>
    createTransport({ host: '127.0.0.1', port: mail.smtpPort, secure: false, ignoreTLS: true }).sendMail({
      from: 'workshop@example.test',
      to: 'ada@example.test',
      subject: 'Your kit: Kasten für Übungen',
      text: 'Open the shelf.',
      html: '<p>Open the <b>shelf</b>.</p>',
    });
  const kept = async () => (await (await fetch(`${mail.url}/api/email`)).json()) as Kept[];

  beforeEach(async () => {
    folder = await mkdtemp(join(tmpdir(), 'fake-mail-'));
  });
  afterEach(async () => {
    await stop();
    await rm(folder, { recursive: true });
  });

  it('shows a message that nodemailer sent, and has it again after a restart', async () => {
    await start({ FAKE_MAIL_DIR: join(folder, 'letters') });
    expect(mail.ready).toBe(true);
    await send();
    const messages = await kept();
    expect(messages).toHaveLength(1);
    expect(messages[0]?.subject).toBe('Your kit: Kasten für Übungen');
    expect(messages[0]?.text).toContain('Open the shelf.');
    expect(messages[0]?.html).toContain('<b>shelf</b>');
    expect(messages[0]?.to.map(({ address }) => address)).toEqual(['ada@example.test']);
    const page = await fetch(mail.url, { headers: { accept: 'text/html' } });
    expect(page.headers.get('content-type')).toContain('text/html');

    expect(await stop()).toBe(0);
    await start({ FAKE_MAIL_DIR: join(folder, 'letters') });
    expect((await kept()).map(({ subject }) => subject)).toEqual(['Your kit: Kasten für Übungen']);
  });

  it('says which setting is missing or wrong', async () => {
    const complaint = async (environment: Record<string, string>) => {
      child = spawn(process.execPath, ['--import', 'tsx', main], { env: { ...process.env, ...environment } });
      let text = '';
      child.stderr?.on('data', (chunk: Buffer) => (text += chunk.toString()));
      const [code] = (await once(child, 'close')) as [number | null];
      expect(code).toBe(1);
      return text;
    };
    expect(await complaint({ FAKE_MAIL_DIR: '' })).toContain('FAKE_MAIL_DIR must name a folder');
    expect(await complaint({ FAKE_MAIL_DIR: folder, FAKE_MAIL_WEB_PORT: 'web' })).toContain(
      'FAKE_MAIL_WEB_PORT must be a port number',
    );
  });
});
