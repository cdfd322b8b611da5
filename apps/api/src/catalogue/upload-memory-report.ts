import { createHash, randomUUID } from 'node:crypto';
import { readFileSync } from 'node:fs';
import { request, type IncomingMessage } from 'node:http';
import { text } from 'node:stream/consumers';

/**
 * Uploads a generated binary STL to a running API and tells how much memory its process took: at rest, while
 * the file streamed in, and while it was measured. Run with tsx and these variables:
 *   WINDCHEST_URL       address of the API, http://127.0.0.1:4600
 *   WINDCHEST_PID       process id of the API, on this machine
 *   WINDCHEST_EMAIL, WINDCHEST_PASSPHRASE   a maker's sign-in
 *   WINDCHEST_MIB       size of the mesh, 300
 */
const required = (name: string): string => {
  const value = process.env[name];
  if (!value) throw new Error(`Set ${name}; the head of this file says what it is.`);
  return value;
};
const base = new URL(process.env['WINDCHEST_URL'] ?? 'http://127.0.0.1:4600');
const pid = required('WINDCHEST_PID');
const mib = Number(process.env['WINDCHEST_MIB'] ?? '300');

const memoryMib = (field: 'VmRSS' | 'VmHWM'): number => {
  const status = readFileSync(`/proc/${pid}/status`, 'utf8');
  return Math.round(Number(new RegExp(`${field}:\\s+(\\d+) kB`).exec(status)?.[1]) / 1024);
};

let cookie = '';
const call = async <T>(
  method: string,
  path: string,
  body?: unknown,
  type = 'application/json',
  write?: (send: (chunk: Buffer) => Promise<void>) => Promise<void>,
): Promise<T> => {
  const headers: Record<string, string> = { 'X-Windchest': '1', 'Content-Type': type, Cookie: cookie };
  const answer = await new Promise<IncomingMessage>((resolve, reject) => {
    const sent = request(new URL(path, base), { method, headers }, resolve).on('error', reject);
    const send = (chunk: Buffer): Promise<void> =>
      sent.write(chunk) ? Promise.resolve() : new Promise((drained) => sent.once('drain', drained));
    if (write) write(send).then(() => sent.end(), reject);
    else sent.end(body === undefined ? undefined : JSON.stringify(body));
  });
  cookie = answer.headers['set-cookie']?.map((one) => one.split(';')[0]).join('; ') ?? cookie;
  const words = await text(answer);
  if ((answer.statusCode ?? 500) >= 300) throw new Error(`${method} ${path}: ${answer.statusCode} ${words}`);
  return (words === '' ? undefined : JSON.parse(words)) as T;
};

/** A wavy sheet with a flat bottom and walls: closed, every triangle different. */
const TRIANGLE_BYTES = 50;
const side = Math.floor(Math.sqrt((mib * 1024 ** 2 - 84) / TRIANGLE_BYTES / 4));
const triangles = 4 * side * side + 8 * side;
type Point = readonly [number, number, number];
const top = (i: number, j: number): Point => [i * 0.05, j * 0.05, 5 + Math.sin(i / 40) + Math.cos(j / 55)];
const bottom = (i: number, j: number): Point => [i * 0.05, j * 0.05, 0];

function* meshRows(): Generator<Point[]> {
  for (let i = 0; i < side; i++) {
    const row: Point[] = [];
    for (let j = 0; j < side; j++) {
      const [a, b, c, d] = [top(i, j), top(i + 1, j), top(i + 1, j + 1), top(i, j + 1)];
      row.push(a, b, c, a, c, d);
      const [e, f, g, h] = [bottom(i, j), bottom(i + 1, j), bottom(i + 1, j + 1), bottom(i, j + 1)];
      row.push(e, g, f, e, h, g);
    }
    yield row;
  }
  const walls: Point[] = [];
  const wall = (p: readonly [number, number], q: readonly [number, number]): number =>
    walls.push(bottom(...p), bottom(...q), top(...q), bottom(...p), top(...q), top(...p));
  for (let k = 0; k < side; k++) {
    wall([k, 0], [k + 1, 0]);
    wall([side, k], [side, k + 1]);
    wall([side - k, side], [side - k - 1, side]);
    wall([0, side - k], [0, side - k - 1]);
  }
  yield walls;
}

const toBytes = (corners: readonly Point[]): Buffer => {
  const bytes = Buffer.alloc((corners.length / 3) * TRIANGLE_BYTES);
  corners.forEach((point, at) => {
    const offset = Math.floor(at / 3) * TRIANGLE_BYTES + 12 + (at % 3) * 12;
    point.forEach((value, axis) => bytes.writeFloatLE(value, offset + 4 * axis));
  });
  return bytes;
};

const main = async (): Promise<void> => {
  await call('POST', '/api/session', {
    email: required('WINDCHEST_EMAIL'),
    passphrase: required('WINDCHEST_PASSPHRASE'),
  });
  const kit = await call<{ id: string }>('POST', '/api/workshop/kits', {
    name: 'Memory report',
    slug: `memory-report-${randomUUID().slice(0, 8)}`,
    tagline: '',
    description: '',
    colour: 'blue',
  });
  const revision = await call<{ id: string }>('POST', `/api/workshop/kits/${kit.id}/revisions`, {
    step: 'issue',
  });
  const atRest = memoryMib('VmRSS');
  const peakBefore = memoryMib('VmHWM');
  let whileStreaming = 0;
  const watch = setInterval(() => (whileStreaming = Math.max(whileStreaming, memoryMib('VmRSS'))), 20);
  let bytes = 84;
  const hash = createHash('sha256');
  const header = Buffer.alloc(84);
  header.writeUInt32LE(triangles, 80);
  const started = performance.now();
  const file = await call<{ id: string; sha256: string }>(
    'POST',
    `/api/workshop/revisions/${revision.id}/files`,
    undefined,
    'multipart/form-data; boundary=report',
    async (send) => {
      const part = 'Content-Disposition: form-data; name="file"; filename="Sheet.stl"';
      await send(Buffer.from(`--report\r\n${part}\r\nContent-Type: model/stl\r\n\r\n`));
      hash.update(header);
      await send(header);
      for (const row of meshRows()) {
        const chunk = toBytes(row);
        bytes += chunk.length;
        hash.update(chunk);
        await send(chunk);
      }
      clearInterval(watch);
      await send(Buffer.from('\r\n--report--\r\n'));
    },
  );
  const seconds = (performance.now() - started) / 1000;
  if (file.sha256 !== hash.digest('hex')) throw new Error('The API kept other bytes than were sent.');
  console.log(
    `sent ${(bytes / 1024 ** 2).toFixed(0)} MiB, ${triangles} triangles, in ${seconds.toFixed(1)} s`,
  );
  console.log(`memory of the API process: ${atRest} MiB at rest (peak before: ${peakBefore} MiB)`);
  console.log(`  ${whileStreaming} MiB at most while the file streamed in`);
  await untilMeasured(revision.id);
  console.log(
    `  ${memoryMib('VmHWM')} MiB at most with the measuring thread, which lives in the same process`,
  );
};

interface Seen {
  parts: { file: { measuring: string; fault: string | null; measurement: unknown } | null }[];
}
const untilMeasured = async (revisionId: string): Promise<void> => {
  const started = performance.now();
  let slowestMs = 0;
  for (;;) {
    const asked = performance.now();
    const { parts } = await call<Seen>('GET', `/api/workshop/revisions/${revisionId}`);
    slowestMs = Math.max(slowestMs, performance.now() - asked);
    const file = parts[0]?.file;
    if (file?.measuring === 'measured' || file?.measuring === 'refused') {
      const seconds = ((performance.now() - started) / 1000).toFixed(1);
      console.log(
        `${file.measuring} after ${seconds} s; the API answered within ${slowestMs.toFixed(0)} ms meanwhile`,
      );
      console.log(`  ${file.fault ?? JSON.stringify(file.measurement)}`);
      return;
    }
    await new Promise((resolve) => setTimeout(resolve, 250));
  }
};

await main();
