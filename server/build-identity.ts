import { createHash } from 'node:crypto';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/**
 * Which build of the core computes here: twelve digits over its code. A run's stored state is trusted only by the very
 * build that computed it, and a discrepancy names it.
 */
export function coreBuild(folder = join(__dirname, '..', 'procedures')): string {
  const hash = createHash('sha256');
  const files = readdirSync(folder, { recursive: true, withFileTypes: true })
    .filter((entry) => entry.isFile() && /(?<!\.spec|\.d)\.[jt]s$/.test(entry.name))
    .map((entry) => join(entry.parentPath, entry.name))
    .sort();
  for (const file of files) hash.update(`${file.slice(folder.length)}\0`).update(readFileSync(file));
  return `core-${hash.digest('hex').slice(0, 12)}`;
}
