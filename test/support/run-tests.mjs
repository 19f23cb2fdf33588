// @ts-check
// npm test: everything set up again from nothing, every check, a ledger of what each part took, and one closing line.
import { fileURLToPath } from 'node:url';
import { nodeVersionProblem } from '../../server/start/node-version.mjs';

const problem = nodeVersionProblem(process.versions.node);
if (problem !== undefined) {
  process.stderr.write(`${problem}\n`);
  process.exit(1);
}
// Loaded only now: an older Node can't even read what these import.
const { runAllTests } = await import('./run-all-tests.mjs');
await runAllTests(fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, ''));
