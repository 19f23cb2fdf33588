// @ts-check
import { join } from 'node:path';
import { runCommand } from './commands.mjs';
import { startOwnDatabase } from './own-database.mjs';
import { StartProblem, lastLines } from './sentences.mjs';

/** @typedef {import('./own-database.mjs').DatabaseUrls} DatabaseUrls */

export const prepareFile = 'dist/server/server/database/prepare.js';

/**
 * The given database, or this checkout's own one, started.
 * @param {string} root the checkout
 * @param {string} dataFolder
 * @param {import('./settings.mjs').StartSettings} settings
 * @param {import('./kept-secrets.mjs').Secrets & { areNew: boolean }} secrets
 * @returns {Promise<DatabaseUrls>}
 */
export async function openDatabase(root, dataFolder, settings, secrets) {
  return settings.database ?? (await startOwnDatabase(root, dataFolder, secrets));
}

/**
 * Brings the tables up to date and puts the demo in once, by the compiled server's own command.
 * @param {string} root the checkout
 * @param {DatabaseUrls} urls
 * @param {boolean} isDemo
 */
export async function prepareDatabase(root, urls, isDemo) {
  const { code, output } = await runCommand(process.execPath, [join(root, prepareFile)], {
    cwd: root,
    env: {
      ...process.env,
      DATABASE_URL: urls.appUrl,
      DATABASE_OWNER_URL: urls.ownerUrl,
      BAYHAND_DEMO: isDemo ? '1' : '0',
    },
  });
  if (code !== 0)
    throw new StartProblem(
      `The database could not be prepared: ${lastLines(output)}\nMend that, then run the same command again.`,
    );
}
