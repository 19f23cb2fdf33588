// @ts-check
// Runs one command with a fresh PostgreSQL of its own, for a single integration spec:
//   node test/support/with-test-cluster.mjs npx jest --config test/jest.config.cjs test/integration/push.spec.ts
import { spawn } from 'node:child_process';
import { StartProblem, tellAndExit } from '../../server/start/sentences.mjs';
import { endGroup } from '../../server/start/commands.mjs';
import { atStop, stopAll, stopOnSignals } from '../../server/start/stopping.mjs';
import { startTestCluster } from './test-cluster.mjs';

stopOnSignals(() => 130);
try {
  const [program, ...args] = process.argv.slice(2);
  if (program === undefined) throw new StartProblem('Say which command to run: with-test-cluster.mjs COMMAND ...');
  const { url } = await startTestCluster();
  const env = { ...process.env, BAYHAND_TEST_DATABASE_URL: url };
  const child = spawn(program, args, { stdio: 'inherit', env, detached: true });
  const forget = atStop(() => endGroup(child.pid));
  const code = await new Promise((resolve, reject) => child.on('exit', resolve).on('error', reject));
  forget();
  await stopAll();
  process.exitCode = code ?? 1;
} catch (error) {
  await tellAndExit(error);
}
