import { addUp, emptyTally, failedOnce, jestTally, playwrightTally, tallyLine } from './tally.mjs';

const jestFile = (name: string, status: string, tests: [string, string][], message = '') => ({
  name,
  status,
  message,
  assertionResults: tests.map(([fullName, state]) => ({
    fullName,
    status: state,
    failureMessages: state === 'failed' ? ['\u001b[31mexpected 2, got 3\u001b[39m'] : [],
  })),
});

describe('adding up test results', () => {
  it('counts what Jest reports and takes the colours off its messages', () => {
    const tally = jestTally(
      {
        testResults: [
          jestFile('/p/a.spec.ts', 'passed', [
            ['adds', 'passed'],
            ['waits', 'pending'],
            ['plans', 'todo'],
          ]),
          jestFile('/p/b.spec.ts', 'failed', [
            ['takes away', 'failed'],
            ['doubles', 'passed'],
          ]),
        ],
      },
      '/p',
    );
    expect(tally).toEqual({
      passed: 2,
      skipped: 2,
      failures: [{ title: 'b.spec.ts: takes away', detail: 'expected 2, got 3' }],
    });
  });

  it('counts a file that cannot be loaded, or fails outside its tests, as one failed', () => {
    const { passed, failures } = jestTally(
      {
        testResults: [
          jestFile('/p/c.spec.ts', 'failed', [], 'Cannot find module'),
          jestFile('/p/d.spec.ts', 'failed', [['works', 'passed']], 'afterAll failed'),
        ],
      },
      '/p',
    );
    expect(passed).toBe(1);
    expect(failures).toEqual([
      { title: 'c.spec.ts', detail: 'Cannot find module' },
      { title: 'd.spec.ts', detail: 'afterAll failed' },
    ]);
  });

  it('counts what Playwright reports, through nested groups and several browsers', () => {
    const test = (status: 'expected' | 'unexpected' | 'flaky' | 'skipped', projectName = '') => ({
      status,
      projectName,
      results: [{ errors: [{ message: 'first try' }] }, { errors: [{ message: 'no such button' }] }],
    });
    const tally = playwrightTally({
      errors: [{ message: 'no tests found' }],
      suites: [
        {
          title: 'buy.spec.ts',
          specs: [{ title: 'pays', tests: [test('expected'), test('unexpected', 'narrow')] }],
          suites: [
            {
              title: 'with a coupon',
              specs: [{ title: 'pays less', tests: [test('flaky'), test('skipped')] }],
            },
          ],
        },
      ],
    });
    expect(tally).toEqual({
      passed: 2,
      skipped: 1,
      failures: [
        { title: 'Outside of any test', detail: 'no tests found' },
        { title: '[narrow] buy.spec.ts › pays', detail: 'no such button' },
      ],
    });
  });

  it('ends in one plain line', () => {
    const total = addUp(emptyTally(), { passed: 12, skipped: 1, failures: [] }, failedOnce('Style'));
    expect(tallyLine(total)).toBe('12 passed, 1 failed');
  });
});
