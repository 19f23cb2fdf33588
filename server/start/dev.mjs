// @ts-check
// npm run dev: the same database, the server rebuilt and restarted at every change, the app with live reload.
import { fileURLToPath } from 'node:url';
import { nodeVersionProblem } from './node-version.mjs';

const problem = nodeVersionProblem(process.versions.node);
if (problem !== undefined) {
  process.stderr.write(`${problem}\n`);
  process.exit(1);
}
// Loaded only now: an older Node can't even read what these import.
const { developBayhand } = await import('./develop-bayhand.mjs');
await developBayhand(fileURLToPath(new URL('../..', import.meta.url)).replace(/\/$/, ''));
