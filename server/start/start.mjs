// @ts-check
// npm start: everything from a fresh checkout to a running Bayhand, and back to nothing on Ctrl-C.
import { fileURLToPath } from 'node:url';
import { nodeVersionProblem } from './node-version.mjs';

const problem = nodeVersionProblem(process.versions.node);
if (problem !== undefined) {
  process.stderr.write(`${problem}\n`);
  process.exit(1);
}
// Loaded only now: an older Node can't even read what these import.
const { startBayhand } = await import('./start-bayhand.mjs');
await startBayhand(fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, ''));
