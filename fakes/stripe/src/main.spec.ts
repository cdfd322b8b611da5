import { spawn, type ChildProcess } from 'node:child_process';
import { once } from 'node:events';
import { createInterface } from 'node:readline';
import { fileURLToPath } from 'node:url';

const main = fileURLToPath(new URL('main.ts', import.meta.url));

describe('the stand-in as a process', () => {
  let child: ChildProcess;
  const start = (environment: Record<string, string>) => {
    child = spawn(process.execPath, ['--import', 'tsx', main], { env: { ...process.env, ...environment } });
  };
  afterEach(() => {
    child.kill('SIGKILL');
  });

  it('says in one line that it is ready, takes its key from the environment and ends on SIGTERM', async () => {
    start({ FAKE_STRIPE_KEY: 'sk_test_other', FAKE_STRIPE_BASE_URL: 'http://pay.test' });
    const ended = once(child, 'exit');
    if (!child.stdout) throw new Error('The process has no output to read.');
    const [line] = (await once(createInterface(child.stdout), 'line')) as [string];
    const { ready, url } = JSON.parse(line) as { ready: boolean; url: string };
    expect(ready).toBe(true);
    const response = await fetch(`${url}/v1/checkout/sessions`, {
      method: 'POST',
      headers: { authorization: 'Bearer sk_test_other' },
      body:
        'mode=payment&success_url=http://shop.test/&line_items[0][quantity]=1' +
        '&line_items[0][price_data][currency]=eur&line_items[0][price_data][unit_amount]=500' +
        '&line_items[0][price_data][product_data][name]=Whistle',
    });
    const session = (await response.json()) as { id: string; url: string };
    expect(session.url).toBe(`http://pay.test/pay/${session.id}`);
    child.kill('SIGTERM');
    expect(await ended).toEqual([0, null]);
  });

  it('says which setting is wrong', async () => {
    start({ FAKE_STRIPE_PORT: 'eighty' });
    let text = '';
    child.stderr?.on('data', (chunk: Buffer) => (text += chunk.toString()));
    const [code] = (await once(child, 'close')) as [number];
    expect(code).toBe(1);
    expect(text).toContain('FAKE_STRIPE_PORT must be a port number from 0 to 65535, not "eighty".');
  });
});
