// @ts-check
import { ensureDataFolder } from './data-folder.mjs';
import { portHindrance } from './free-port.mjs';
import { keptSecrets } from './kept-secrets.mjs';
import { ensurePostgres } from './postgres-programs.mjs';
import { beTheOnlyStart } from './running-start.mjs';
import { StartProblem } from './sentences.mjs';
import { portProblem, startSettings } from './settings.mjs';

/**
 * What `npm start` and `npm run dev` do first: read the environment and make sure that a start can work, before
 * anything slow is done.
 * @param {string} root the checkout
 */
export async function begin(root) {
  process.chdir(root);
  const settings = startSettings(process.env);
  const dataFolder = ensureDataFolder(root);
  const { noteServer } = await beTheOnlyStart(root, dataFolder);
  const hindrance = await portHindrance(settings.host, settings.port);
  if (hindrance !== undefined) throw new StartProblem(portProblem(hindrance, settings));
  // Before anything slow: who may not install it should hear so at once.
  if (settings.database === undefined) await ensurePostgres();
  return { settings, dataFolder, noteServer, secrets: await keptSecrets(dataFolder) };
}
