// Draws the app's PNG icons from its one SVG mark, in Chromium: node test/support/render-icons.mjs
// Run it after the mark has changed; the PNGs are kept in the repository.
import { readFile, writeFile } from 'node:fs/promises';
import { chromium } from '@playwright/test';

const folder = new URL('../../src/public/icons/', import.meta.url);
const mark = await readFile(new URL('bayhand.svg', folder), 'utf8');

/** A maskable icon fills its square: what matters lies in the middle 80 % (W3C, Web App Manifest, icon masks). */
const icons = [
  { name: 'bayhand-192.png', size: 192, isMaskable: false },
  { name: 'bayhand-512.png', size: 512, isMaskable: false },
  { name: 'bayhand-maskable-512.png', size: 512, isMaskable: true },
];

const browser = await chromium.launch({ executablePath: '/usr/bin/chromium', args: ['--no-sandbox'] });
try {
  for (const { name, size, isMaskable } of icons) {
    const page = await browser.newPage({ viewport: { width: size, height: size } });
    const inner = isMaskable ? Math.round(size * 0.86) : size;
    await page.setContent(`<!doctype html><style>
      html { background: ${isMaskable ? '#0b4f5c' : 'transparent'} }
      body { margin: 0; display: grid; place-items: center; height: 100vh }
      svg { width: ${inner}px; height: ${inner}px; display: block }
    </style>${mark}`);
    await writeFile(new URL(name, folder), await page.screenshot({ omitBackground: !isMaskable }));
    await page.close();
  }
} finally {
  await browser.close();
}
