// @ts-check
import { join } from 'node:path';

/**
 * One part of the tests.
 * @typedef {object} TestPart
 * @property {string} name
 * @property {string[]} command npm's arguments, or the program of a package and its arguments
 * @property {'check' | 'jest' | 'browser'} kind how its result is counted; a check is one test, by its exit code
 * @property {string} [report] the JSON file that it writes
 * @property {number} cores how many it keeps busy
 * @property {string[]} after parts that must have ended before, well or not
 * @property {string[]} needs parts without whose success it can't run
 */

/**
 * Every part, in the order in which they are begun as cores become free: first what others wait for, then the long ones.
 * @param {string} results the folder of the reports
 * @returns {TestPart[]}
 */
export function testParts(results) {
  const documents = check('build: documents', 'build:document');
  const server = check('build: server', 'build:server', { after: [documents.name] });
  const app = check('build: app', 'build:app', { after: [documents.name] });
  return [
    documents,
    server,
    app,
    // Some of these start the compiled server.
    { ...specs('server', results), needs: [server.name] },
    specs('app', results),
    // It reads and writes what the server's incremental build keeps.
    check('types', 'types', { after: [server.name] }),
    specs('core', results),
    check('lint', 'lint', { after: [documents.name] }),
    {
      name: 'browser tests',
      command: ['playwright', 'test', '--config', 'test/browser/playwright.config.ts'],
      kind: 'browser',
      report: join(results, 'browser.json'),
      cores: 2,
      after: [],
      needs: [server.name, app.name],
    },
  ];
}

/**
 * @param {string} name
 * @param {string} script of package.json
 * @param {{ after?: string[] }} [order]
 * @returns {TestPart}
 */
const check = (name, script, { after = [] } = {}) => ({
  name,
  command: ['npm', 'run', '--silent', script],
  kind: 'check',
  cores: 1,
  after,
  needs: [],
});

/**
 * @param {string} project one of test/jest.config.cjs
 * @param {string} results
 * @returns {TestPart}
 */
function specs(project, results) {
  const report = join(results, `specs-${project}.json`);
  return {
    name: `specs: ${project}`,
    command: [
      ...['jest', '--config', 'test/jest.config.cjs', '--selectProjects', project, '--ci'],
      // One worker runs inside this process: the other core belongs to another part.
      ...['--maxWorkers', '1', '--json', '--outputFile', report],
    ],
    kind: 'jest',
    report,
    cores: 1,
    after: [],
    needs: [],
  };
}
