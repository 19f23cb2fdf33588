// @ts-check
// npm run test:long: what takes minutes, its tables as text and JSON, and one closing line.
import { spawnSync } from 'node:child_process';
import { mkdirSync, readdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { closingLine } from '../support/ledger.mjs';
import { countJest } from '../support/read-report.mjs';

const root = fileURLToPath(new URL('../..', import.meta.url));
const results = join(root, 'test-results/long');
const report = join(results, 'report.json');
rmSync(results, { recursive: true, force: true });
mkdirSync(results, { recursive: true });

const { status } = spawnSync(
  process.execPath,
  [
    join(root, 'node_modules/jest/bin/jest.js'),
    ...['--config', 'test/long/jest.config.cjs', '--ci', '--maxWorkers', '1', '--json', '--outputFile', report],
    ...process.argv.slice(2),
  ],
  { cwd: root, stdio: ['ignore', 'ignore', 'inherit'] },
);
for (const file of readdirSync(results).filter((name) => name.endsWith('.txt'))) {
  process.stdout.write(`\n${readFileSync(join(results, file), 'utf8')}`);
}
for (const file of readdirSync(results).filter((name) => name.endsWith('.json') && name !== 'report.json')) {
  process.stdout.write(`\n${file}: ${JSON.stringify(JSON.parse(readFileSync(join(results, file), 'utf8')))}\n`);
}
const counts = countJest(JSON.parse(readFileSync(report, 'utf8')));
process.stdout.write(`\n${closingLine(counts)}\n`);
process.exitCode = status === 0 && counts.failed === 0 && counts.passed > 0 ? 0 : 1;
