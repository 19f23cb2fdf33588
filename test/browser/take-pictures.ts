import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { signIn } from './support/visits';

const folder = process.env['BAYHAND_PICTURES'] ?? join(__dirname, 'pictures');
const sizes = [
  { width: 1280, height: 800 },
  { width: 800, height: 1280 },
  { width: 360, height: 740 },
] as const;
/** A few pictures stand in the README; all of them are taken when asked for. */
const isAll = process.env['BAYHAND_PICTURES'] !== undefined;
const inReadme = new Set(['step-reading', 'step-listen', 'bench', 'record']);

async function picture(page: Page, name: string): Promise<void> {
  if (!isAll && !inReadme.has(name)) return;
  mkdirSync(folder, { recursive: true });
  const shoot = async (theme: string, size: (typeof sizes)[number]): Promise<void> => {
    await page.setViewportSize(size);
    await page.evaluate((to) => (document.documentElement.dataset['theme'] = to), theme);
    await page.evaluate(() => document.fonts.ready);
    // Two frames: the plot draws itself anew in the frame after a change of size or theme.
    await page.evaluate(() => new Promise((done) => requestAnimationFrame(() => requestAnimationFrame(done))));
    await page.waitForTimeout(250);
    await page.screenshot({ path: join(folder, `${name}-${theme}-${size.width}x${size.height}.png`) });
  };
  for (const size of isAll ? sizes : [sizes[0]]) await shoot('day', size);
  for (const theme of isAll ? ['night', 'glare'] : []) await shoot(theme, sizes[0]);
  await page.setViewportSize(sizes[0]);
  await page.evaluate(() => (document.documentElement.dataset['theme'] = 'day'));
}

const ramp = join(__dirname, '../reference/ramps/demo-warm-seals.csv');

function answers(page: Page): Answers {
  return {
    gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
    read: { '2e': ['14', '12'], '4': ['1014'], '5': ['94.2'], '6': ['93.9'], '15b': ['0.0'] },
    way: { '4': 'Altimeter setting' },
    codes: { '3': ['P0068 stored'], '18a': ['P0068 stored', 'P0106 pending'], '19c': [] },
    choose: {
      '12b': ['It stayed quiet'],
      '18b': ['They are cleared'],
      '19': ['Both halves are done'],
      '19a': ['Nothing forbids driving'],
      '19b': ['Idle', 'Steady ride'],
    },
    look: async (step) => {
      if (step.number === '4') await picture(page, 'step-ways');
      if (step.number === '5') {
        for (const digit of ['9', '4', 'decimal point', '2']) {
          await page.locator('bay-number-pad').getByRole('button', { name: digit, exact: true }).click();
        }
        await picture(page, 'step-reading');
        for (let i = 0; i < 4; i += 1) await page.getByRole('button', { name: 'Erase' }).click();
      }
      const named: Record<string, string> = {
        '2e': 'step-wait',
        '3': 'step-codes',
        '6a': 'step-compute',
        '7': 'step-action',
        '12a': 'step-hold',
        '12b': 'step-choice',
        '16': 'step-restore',
        '18a': 'step-codes-after',
        '19b': 'step-drive',
      };
      const name = named[step.number];
      if (name !== undefined) await picture(page, name);
      if (step.number === '9a') {
        await tap(page.getByRole('button', { name: 'Stop, supply off' }));
        await picture(page, 'stop');
        await tap(page.getByRole('button', { name: /Back to step/ }));
        await page.getByRole('button', { name: /disturbed/ }).click();
        await picture(page, 'open-list');
        await page.reload();
        await expect(page.getByText('Now: step 9a')).toBeVisible();
        await picture(page, 'resume');
        await tap(page.getByRole('button', { name: /Go on with step 9a/ }));
        await page.getByRole('button', { name: 'Not sure' }).click();
        await picture(page, 'not-sure');
        await page.reload();
        await tap(page.getByRole('button', { name: /Go on with step 9a/ }));
      }
    },
    listen: async () => {
      await picture(page, 'step-listen-live');
      await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
      await picture(page, 'step-listen-file');
      await page.locator('input[type=file]').setInputFiles(ramp);
      await expect(page.getByText('381 samples')).toBeVisible();
      await picture(page, 'step-listen-columns');
      await tap(page.getByRole('button', { name: 'Take this series' }));
      await expect(page.getByText('Gauge at the mark')).toBeVisible();
      await picture(page, 'step-listen');
      await tap(page.getByRole('button', { name: /Keep the mark/ }));
    },
  };
}

test('pictures of every screen', async ({ switchOn }) => {
  const { page } = await switchOn();
  await page.goto('/');
  await expect(page.getByLabel('Name')).toBeVisible();
  await picture(page, 'sign-in');
  await signIn(page, 'okafor');
  await picture(page, 'bench-empty');
  await page
    .getByRole('link', { name: 'New visit' })
    .or(page.getByRole('button', { name: 'New visit' }))
    .click();
  await page.getByLabel('VIN').fill('7ZZFD9HA0NP301446');
  await picture(page, 'visit-form');
  await page.goto('/');
  await page
    .getByRole('link', { name: /Take it/ })
    .or(page.getByRole('button', { name: /Take it/ }))
    .click();
  await expect(page.getByText('Procedures that fit')).toBeVisible();
  await picture(page, 'visit');
  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await expect(page.locator('.frame h1').first()).toBeVisible();
  await picture(page, 'start-card');
  const given = answers(page);
  await walkTo(page, '7', given);
  await page.goto('/');
  await expect(page.getByText('On the car now')).toBeVisible();
  await picture(page, 'bench');
  await page
    .getByRole('link', { name: /Go back to step/ })
    .or(page.getByRole('button', { name: /Go back to step/ }))
    .first()
    .click();
  const goOn = page.getByRole('button', { name: /Go on with step 7/ });
  await tap(goOn);
  await walkTo(page, 'the end', { ...given, read: { ...given.read } });
  await picture(page, 'finding');
  await tap(page.getByRole('button', { name: 'Keep the write-up' }));
  await tap(page.getByRole('button', { name: /To the closing/ }));
  await picture(page, 'closing');
  await tap(page.getByRole('button', { name: 'Close the run' }));
  await tap(page.getByRole('button', { name: 'To the Bench' }));
  await page.goto('/gear');
  await expect(page.getByText('G-12')).toBeVisible();
  await picture(page, 'gear');
  await page.goto('/');
  await expect(page.getByText(/nothing waits to be sent/)).toBeVisible({ timeout: 60_000 });
  await signOut(page, 'I. Okafor');
  await signIn(page, 'lindqvist');
  await page.goto('/records');
  await expect(page.locator('bay-record-table').getByRole('link').first()).toBeVisible();
  await picture(page, 'records');
  await page.locator('bay-record-table').getByRole('link').first().click();
  await expect(page.getByText(/Chain whole/)).toBeVisible();
  await expect(page.locator('bay-series-view canvas').first()).toBeVisible();
  await picture(page, 'record');
  await signOut(page, 'M. Lindqvist');
  await signIn(page, 'adeyemi');
  await picture(page, 'bench-lead');
  await page.goto('/method');
  await expect(page.getByText('Crankcase valve seal').first()).toBeVisible();
  await picture(page, 'method');
  await signOut(page, 'R. Adeyemi');
  await signIn(page, 'brandt');
  await picture(page, 'bench-apprentice');
  await page.goto('/practice');
  await expect(page.getByText('Cars with a fault')).toBeVisible();
  await picture(page, 'practice');
});

async function signOut(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name }).click();
  await page
    .getByRole('button', { name: 'Sign out' })
    .or(page.getByRole('menuitem', { name: 'Sign out' }))
    .click();
  await expect(page.getByLabel('Password', { exact: true })).toBeVisible();
}
