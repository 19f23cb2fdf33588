// @ts-check
import { ensureDebianPackages, isExecutable } from '../../server/start/debian-packages.mjs';

/** Installs Debian's Chromium where it is missing: no test tool downloads a browser of its own. */
export async function ensureChromium() {
  await ensureDebianPackages({
    what: 'Chromium',
    packages: ['chromium'],
    isThere: () => isExecutable('/usr/bin/chromium'),
  });
}
