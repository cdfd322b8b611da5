import { ThreadMeshRunner } from './thread-mesh-runner.js';

describe('the threads that measure', () => {
  const worker = new URL('./fixtures/misbehaving-worker.mjs', import.meta.url);
  const hurried = new ThreadMeshRunner({ worker, threads: 1, timeoutMs: 1000, maxHeapMb: 64 });
  const patient = new ThreadMeshRunner({ worker, threads: 1, timeoutMs: 50_000, maxHeapMb: 32 });
  afterAll(() => Promise.all([hurried.close(), patient.close()]));
  const run = (fileName: string, runner = patient) => runner.run({ path: '/nowhere', fileName });

  it('hand back what the work found', async () => {
    expect(await run('a.stl')).toEqual({ isMeasured: false, code: 'fine', fault: 'a.stl' });
  });

  it.each([
    ['fill', 'out-of-memory', /needs more memory/],
    ['exit', 'worker-ended', /ended by itself/],
    ['throw', 'worker-ended', /the reader stumbled/],
  ])('make a sentence of work that does %s, and go on with the next file', async (name, code, sentence) => {
    const outcome = await run(name);
    expect(outcome).toMatchObject({ isMeasured: false, code });
    expect((outcome as { fault: string }).fault).toMatch(sentence);
    expect(await run('next.stl')).toMatchObject({ fault: 'next.stl' });
  });

  it('compare beside measuring, and make a sentence of what goes wrong there too', async () => {
    const compare = (afterPath: string, runner = patient) =>
      runner.compare({ beforePath: '/nowhere', afterPath });
    expect(await compare('b.stl')).toEqual({ isCompared: false, code: 'fine', fault: 'b.stl' });
    expect(await compare('fill')).toMatchObject({ isCompared: false, code: 'out-of-memory' });
    expect(await compare('hang', hurried)).toMatchObject({
      isCompared: false,
      code: 'timed-out',
      fault: 'comparing the two files takes longer than 1 s. Export the part with fewer triangles.',
    });
  });

  it('give up on work that takes too long, and go on with the next file', async () => {
    const outcome = await run('hang', hurried);
    expect(outcome).toMatchObject({ isMeasured: false, code: 'timed-out' });
    expect((outcome as { fault: string }).fault).toMatch(/takes longer than 1 s to measure/);
    expect(await run('next.stl', hurried)).toMatchObject({ fault: 'next.stl' });
  });

  it('say when there is more work than threads', async () => {
    const both = [run('one.stl'), run('two.stl')];
    await new Promise(setImmediate);
    expect(patient.isCrowded).toBe(true);
    await Promise.all(both);
    expect(patient.isCrowded).toBe(false);
  });

  it('give each file its whole time, however long it waited for a thread', async () => {
    const outcomes = await Promise.all([
      run('hang', hurried),
      run('hang', hurried),
      run('last.stl', hurried),
    ]);
    expect(outcomes.map((one) => (one as { code: string }).code)).toEqual(['timed-out', 'timed-out', 'fine']);
  });
});
