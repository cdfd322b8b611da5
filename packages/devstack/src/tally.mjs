import { stripVTControlCharacters } from 'node:util';

/**
 * @typedef {{ title: string, detail: string }} Failure
 * @typedef {{ passed: number, skipped: number, failures: Failure[] }} Tally
 */

/** @returns {Tally} */
export const emptyTally = () => ({ passed: 0, skipped: 0, failures: [] });

/**
 * @param {string} title
 * @param {string} [detail]
 * @returns {Tally} one failure: a check that is no test, or a run that broke off
 */
export const failedOnce = (title, detail = '') => ({ passed: 0, skipped: 0, failures: [{ title, detail }] });

/** @param {...Tally} tallies @returns {Tally} */
export function addUp(...tallies) {
  return {
    passed: tallies.reduce((sum, tally) => sum + tally.passed, 0),
    skipped: tallies.reduce((sum, tally) => sum + tally.skipped, 0),
    failures: tallies.flatMap((tally) => tally.failures),
  };
}

/** @param {Tally} tally @returns {string} the line a run ends with */
export const tallyLine = ({ passed, failures }) => `${passed} passed, ${failures.length} failed`;

/**
 * @typedef {object} JestReport
 * @property {{ name: string, status: string, message: string, assertionResults: { status: string, fullName: string, failureMessages?: string[] | null }[] }[]} testResults
 */

/**
 * @param {JestReport} report Jest's `--json`
 * @param {string} root taken off the file names
 * @returns {Tally}
 */
export function jestTally({ testResults }, root) {
  return addUp(
    ...testResults.map((file) => {
      const name = file.name.replace(`${root}/`, '');
      const tests = file.assertionResults;
      const failures = tests
        .filter(({ status }) => status === 'failed')
        .map(({ fullName, failureMessages }) => ({
          title: `${name}: ${fullName}`,
          detail: stripVTControlCharacters((failureMessages ?? []).join('\n')),
        }));
      // A file that cannot be loaded, or whose tidying-up fails, has no failed test to show for it.
      if (file.status === 'failed' && failures.length === 0) {
        failures.push({ title: name, detail: stripVTControlCharacters(file.message) });
      }
      return {
        passed: tests.filter(({ status }) => status === 'passed').length,
        skipped: tests.filter(({ status }) => !['passed', 'failed'].includes(status)).length,
        failures,
      };
    }),
  );
}

/**
 * @typedef {{ message?: string, stack?: string }} PlaywrightError
 * @typedef {object} PlaywrightTest
 * @property {'expected' | 'unexpected' | 'flaky' | 'skipped'} status
 * @property {string} [projectName]
 * @property {{ errors?: PlaywrightError[] }[]} results
 *
 * @typedef {object} PlaywrightSuite
 * @property {string} title
 * @property {{ title: string, tests: PlaywrightTest[] }[]} [specs]
 * @property {PlaywrightSuite[]} [suites]
 */

/**
 * @param {{ suites: PlaywrightSuite[], errors?: PlaywrightError[] }} report Playwright's JSON report
 * @returns {Tally} a test that passed only when repeated counts as passed, as Playwright has it
 */
export function playwrightTally({ suites, errors = [] }) {
  const outside = errors.map((error) => ({ title: 'Outside of any test', detail: errorText(error) }));
  return addUp({ passed: 0, skipped: 0, failures: outside }, ...suites.map((suite) => suiteTally(suite, [])));
}

/** @param {PlaywrightSuite} suite @param {string[]} above @returns {Tally} */
function suiteTally({ title, specs = [], suites = [] }, above) {
  const path = [...above, title];
  const own = specs.flatMap((spec) =>
    spec.tests.map((test) => ({ name: [...path, spec.title].join(' › '), ...test })),
  );
  return addUp(
    {
      passed: own.filter(({ status }) => status === 'expected' || status === 'flaky').length,
      skipped: own.filter(({ status }) => status === 'skipped').length,
      failures: own
        .filter(({ status }) => status === 'unexpected')
        .map(({ name, projectName, results }) => ({
          title: projectName ? `[${projectName}] ${name}` : name,
          detail: (results.at(-1)?.errors ?? []).map(errorText).join('\n'),
        })),
    },
    ...suites.map((inner) => suiteTally(inner, path)),
  );
}

/** @param {PlaywrightError} error */
const errorText = ({ message, stack }) => stripVTControlCharacters(stack ?? message ?? 'no message');
