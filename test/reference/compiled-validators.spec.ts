import { spawnSync } from 'node:child_process';
import { join } from 'node:path';

const root = join(__dirname, '../..');

it('the committed validators are what the schemas give', () => {
  const build = join(root, 'procedures/document/build-validators.mjs');
  const check = spawnSync(process.execPath, [build, '--check'], { cwd: root, encoding: 'utf8' });
  expect(check.stderr).toBe('');
  expect(check.status).toBe(0);
});
