// @ts-check
import { tmpdir } from 'node:os';
import { runCommand } from './commands.mjs';

/**
 * Runs npm in the checkout: under npm the same one, otherwise the one on the path.
 * @param {string} root
 * @param {string[]} args
 */
export function runNpm(root, args) {
  const npm = process.env['npm_execpath'];
  const [program, before] = npm?.endsWith('.js') ? [process.execPath, [npm]] : ['npm', []];
  return runCommand(program, [...before, ...args], { cwd: root, env: toolEnv() });
}

/** The environment for build tools: they keep caches in the home folder, which may be missing, and must ask nothing. */
export function toolEnv() {
  return { ...process.env, HOME: process.env['HOME'] || tmpdir(), NG_CLI_ANALYTICS: 'false', CI: 'true' };
}
