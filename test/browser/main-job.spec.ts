import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { canonicalJson, verifyChain, type RunEvent, type RunHeader } from '../../procedures/engine';
import { shownStep, tap, walkTo, type Answers } from './support/at-the-car';
import { expect, test } from './support/test';
import { openVisit, readyWithoutNetwork, signIn, signOut } from './support/visits';
import { eventsInDatabase, eventsOnTablet, rowsOf } from './support/what-is-kept';

const ramp = join(__dirname, '../reference/ramps/demo-warm-seals.csv');

/** Takes the scan tool's file, takes the mark that is offered, and goes on. */
async function listenByFile(page: Page): Promise<void> {
  await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
  await page.locator('input[type=file]').setInputFiles(ramp);
  await expect(page.getByText('381 samples')).toBeVisible();
  await tap(page.getByRole('button', { name: 'Take this series' }));
  await expect(page.getByText('Gauge at the mark')).toBeVisible();
  await tap(page.getByRole('button', { name: /Keep the mark/ }));
}

/** Keeps the write-up as composed, reads back and closes. */
async function closeRun(page: Page): Promise<void> {
  for (const name of [/Keep the write-up/, /To the closing/, 'Close the run', 'To the Bench']) {
    await tap(page.getByRole('button', { name }));
  }
}

const warmCar: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
  read: { '2b': ['61', '86'], '4': ['1014'], '5': ['94.2'], '6': ['93.9'], '11a': ['78'], '15b': ['0.0'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored'], '18a': ['P0068 stored', 'P0106 pending'], '19c': [] },
  choose: {
    '12b': ['It stayed quiet'],
    '18b': ['They are cleared'],
    '19': ['Both halves are done'],
    '19a': ['Nothing forbids driving'],
    '19b': ['Idle', 'Steady ride'],
  },
  listen: listenByFile,
};

test('one job from the visit to the Record room, with the network cut and the browser killed in the middle', async ({
  product,
  switchOn,
}) => {
  test.setTimeout(240_000);
  let tablet = await switchOn();
  let { page } = tablet;

  // The technician signs in and opens a visit; a wrong check digit is said beside the field, nothing is lost.
  await signIn(page, 'okafor');
  await readyWithoutNetwork(page);
  const signedInAt = Date.now();
  await openVisit(page, {
    VIN: '7ZZFD9HA0NP301446',
    Make: 'Merrow',
    Model: 'Heron',
    'Repair order (RO)': '4431',
    Odometer: '61240',
    "Concern, in the customer's words": 'Whistle at idle',
    'Trouble codes': 'P0068',
  });
  await page.getByRole('button', { name: 'Add', exact: true }).click();
  await expect(page.locator('#vin-says')).toContainText('check digit');
  await page.getByLabel('VIN').fill('7ZZFD9HA0NP310446');
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await expect(page.getByText('Procedures that fit')).toBeVisible();

  // The network goes away: Chromium is offline and the port is closed.
  await tablet.context.setOffline(true);
  await product.stop();
  await page.getByRole('button', { name: /Start the warm half/ }).click();
  await expect(page.locator('.frame h1').first()).toBeVisible();
  const runId = new URL(page.url()).pathname.split('/').at(-1) ?? '';

  // Up to the middle of the ramp's preparation, then the browser is killed.
  await walkTo(page, '9a', warmCar);
  const before = await eventsOnTablet(page, runId);
  // Chromium writes its cookies to disk 30 s late: a kill before that would cost the session (not the run).
  await page.waitForTimeout(Math.max(0, signedInAt + 35_000 - Date.now()));
  await tablet.kill();

  // Opened again, still offline: the same step, everything in place.
  tablet = await switchOn();
  page = tablet.page;
  await tablet.context.setOffline(true);
  await page.goto(`/run/${runId}`);
  await expect(page.getByText('Now: step 9a')).toBeVisible();
  await expect(page.getByText('dipstick').first()).toBeVisible();
  expect(await eventsOnTablet(page, runId)).toEqual(before);
  await tap(page.getByRole('button', { name: /Go on with step 9a/ }));
  expect((await shownStep(page)).number).toBe('9a');
  await expect(page.getByRole('button', { name: '3 disturbed' })).toBeVisible();

  // To the finding, the write-up, and closed: all without the network.
  await walkTo(page, 'the end', warmCar);
  await expect(page.getByRole('heading', { name: /The manifold valve seals at 3\.\d ± 0\.\d kPa/ })).toBeVisible();
  await closeRun(page);
  const onTablet = (await eventsOnTablet(page, runId)) as unknown as RunEvent[];
  expect(await rowsOf(product.databaseUrl, 'SELECT run_id FROM run WHERE run_id = $1', [runId])).toEqual([]);

  // Back on the network it syncs by itself.
  await product.start();
  await tablet.context.setOffline(false);
  await expect(page.getByText(/nothing waits to be sent/)).toBeVisible({ timeout: 60_000 });

  // The record in PostgreSQL equals, event for event and hash for hash, what the tablet held.
  const inDatabase = await eventsInDatabase(product.databaseUrl, runId);
  expect(inDatabase).toEqual(onTablet.map((event) => canonicalJson(event)));
  const [run] = await rowsOf<{ header: string; status: string; finding: string }>(
    product.databaseUrl,
    'SELECT header, status, finding FROM run WHERE run_id = $1',
    [runId],
  );
  expect(run).toMatchObject({ status: 'closed', finding: 'seals' });
  const header = JSON.parse(run?.header ?? '{}') as RunHeader;
  expect(
    verifyChain(
      header,
      inDatabase.map((text) => JSON.parse(text) as RunEvent),
    ),
  ).toEqual({
    ok: true,
    head: onTablet.at(-1)?.hash,
  });
  expect(await rowsOf(product.databaseUrl, 'SELECT what FROM discrepancy WHERE run_id = $1', [runId])).toEqual([]);

  // The manager finds it in the Record room and reads the whole story.
  await signOut(page, 'I. Okafor');
  await signIn(page, 'lindqvist');
  await page.goto('/records');
  await page.locator('bay-record-table').getByRole('link').first().click();
  await expect(page).toHaveURL(new RegExp(runId));
  await expect(page.getByText(new RegExp(`Chain whole · ${onTablet.length} events`))).toBeVisible();
  const story = page.locator('bay-story-table');
  for (const told of [
    '94.2',
    '93.9',
    'in band',
    'noiseStopped and inBand(sealPoint)',
    'Altimeter setting',
    'dipstick',
  ]) {
    await expect(story).toContainText(told);
  }
  await expect(page.locator('bay-series-view').getByRole('img')).toHaveAccessibleName(/noise stops at/i);
  await expect(page.getByText(/seals at 3\.\d ± 0\.\d kPa/).first()).toBeVisible();
  await tablet.close();
});
