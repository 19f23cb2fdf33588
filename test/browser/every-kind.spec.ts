import { createHash } from 'node:crypto';
import type { Page } from '@playwright/test';
import type { RunEvent } from '../../procedures/engine';
import { plugHold } from '../../procedures/document/testing/plug-hold';
import { walkRound } from '../../procedures/document/testing/walk-round';
import { acknowledge, enter, tap } from './support/at-the-car';
import { bringChecker, sideways, violations } from './support/measured';
import { publishAsLead } from './support/publish';
import { expect, test } from './support/test';
import { readyWithoutNetwork, signIn, signOut } from './support/visits';
import { eventsOnTablet, rowsOf } from './support/what-is-kept';

// What is published here would be every other file's procedure as well.
test.use({ productName: 'every-kind' });

/** Each size in another theme, so that all of them are seen on these screens. */
const sizes = [
  { width: 800, height: 1280, theme: 'night' },
  { width: 360, height: 740, theme: 'glare' },
  { width: 1280, height: 800, theme: 'day' },
] as const;
const folder = process.env['BAYHAND_KIND_PICTURES'];

/**
 * Holds the screen against what every one of them keeps, in each size and theme: nothing beyond the edge, enough
 * contrast, and on a tablet nothing that the accessibility checker finds. Where somebody asked for pictures, one is taken of each.
 */
async function look(page: Page, name: string): Promise<void> {
  for (const { theme, ...size } of sizes) {
    await page.setViewportSize(size);
    await page.evaluate((theme) => (document.documentElement.dataset['theme'] = theme), theme);
    const where = `${name} at ${size.width}x${size.height}, ${theme}`;
    // The way walked is a strip of its own, which scrolls.
    expect(await sideways(page, 'bay-route .walked'), where).toEqual([]);
    // A tablet that lies across may have a keyboard; what scrolls on a phone is scrolled by the finger.
    const rules = theme === 'day' ? undefined : ['color-contrast'];
    expect(await violations(page, rules), where).toEqual([]);
    if (folder !== undefined) await page.screenshot({ path: `${folder}/${name}-${size.width}x${size.height}.png` });
  }
}

const at = (page: Page, number: string) =>
  expect(page.locator('bay-run-header .chip').first()).toContainText(`Step ${number} of`);
const press = (page: Page, name: string | RegExp) => tap(page.getByRole('button', { name }));

test('walks through a called procedure, a release, photos, timed readings and a stale one, offline', async ({
  product,
  page,
}) => {
  test.setTimeout(300_000);
  await publishAsLead(product.baseUrl, [plugHold, walkRound]);
  await bringChecker(page);
  await signIn(page, 'okafor');
  await readyWithoutNetwork(page);
  await page.getByRole('link', { name: /^Take it/ }).click();
  const card = page.getByRole('article', { name: walkRound.title });
  await expect(card).toContainText('version 1');
  await page.context().setOffline(true);
  await tap(card.getByRole('button', { name: 'Start' }));

  await beginWalkRound(page);
  await at(page, '2');
  await enter(page, '88');

  // Notes are folded, and nothing that can wait is said while the person has to stay.
  await at(page, '3');
  await expect(page.getByText('Stay here')).toBeVisible();
  await page.getByText('2 notes from the author').click();
  await expect(page.getByText('A dry plug creeps; a damp one does not.')).toBeVisible();
  await look(page, 'notes');
  await press(page, /Done,\s+go on/);

  await throughCall(page);
  await secondPersonAndRelease(page);
  const runId = new URL(page.url()).pathname.split('/').at(-1) ?? '';
  await holdWithReadings(page);
  await whereAndPhoto(page);
  await rampWithoutMarks(page);

  // A wait with a least time: the clock first, then the reading.
  await at(page, '10');
  await expect(page.getByText('Keep away from the plug.')).toBeVisible();
  await press(page, 'Start the clock');
  await look(page, 'wait-clock');
  await page.getByRole('button', { name: /Waited,\s+go on/ }).click({ timeout: 30_000 });
  await enter(page, '3.0');
  await expect(page.getByText(/Not yet\. Keep away/)).toBeVisible();
  await look(page, 'wait-reading');
  await enter(page, '0.2');

  // The coolant's reading has ended: one tap leads to its step, and the run comes back.
  await at(page, '11');
  await press(page, /Seen,\s+go on/);
  await expect(page.getByText('A reading no longer holds')).toBeVisible();
  await expect(page.locator('bay-take-again-sheet')).toContainText('A warm engine cools.');
  await look(page, 'stale');
  await press(page, 'Take step 2 again');
  await at(page, '2');
  await enter(page, '84');
  await at(page, '11');
  await press(page, /Seen,\s+go on/);
  await at(page, '12');
  await tap(page.locator('bay-restore-list button').first());
  await expect(page.getByRole('heading', { name: /The intake is tight/ })).toBeVisible();
  for (const name of [/Keep the write-up/, /To the closing/, 'Close the run']) await press(page, name);

  const events = (await eventsOnTablet(page, runId)) as unknown as RunEvent[];
  const types = events.map(({ type }) => type);
  for (const type of ['verified', 'released', 'photo-attached', 'timer-ended', 'series-recorded', 'step-redone']) {
    expect(types).toContain(type);
  }
  await recordTellsIt(page, product.databaseUrl, runId, events);
});

async function beginWalkRound(page: Page): Promise<void> {
  await press(page, /All of this\s+is ready/);
  await press(page, 'I know them');
  await acknowledge(page, 1);
  await page.getByRole('radio', { name: /^G-12/ }).click();
  await press(page, 'Take G-12');
  await press(page, 'Without it');
  await press(page, 'Begin');
}

/** The steps of the called one, numbered under the step that calls; then what it found. */
async function throughCall(page: Page): Promise<void> {
  await at(page, '4.1');
  await acknowledge(page, 1);
  await press(page, /Done,\s+go on/);
  await at(page, '4.2');
  await press(page, /Done,\s+go on/);
  await at(page, '4.3');
  await enter(page, '4.2');
  await at(page, '4.4');
  // Only what the called one took apart is put back there.
  await expect(page.locator('bay-restore-list button')).toHaveCount(1);
  await tap(page.locator('bay-restore-list button').first());
  await at(page, '4');
  await expect(page.getByText('The plug holds 4.2')).toBeVisible();
  await expect(page.locator('bay-judged-line')).toContainText('in band');
  await look(page, 'call');
  await press(page, /Seen,\s+go on/);
}

/** The second person is named by whoever does the step; the lead releases, signed in on this tablet. */
async function secondPersonAndRelease(page: Page): Promise<void> {
  await at(page, '5');
  await expect(page.getByRole('radio', { name: /I\. Okafor/ })).toHaveCount(0);
  await page.getByRole('radio', { name: /T\. Brandt/ }).click();
  await look(page, 'verify');
  await press(page, 'Has looked');
  await expect(page.getByRole('heading', { name: 'The run waits for the lead' })).toBeVisible();
  // It says that it does nothing yet, and answers a tap all the same.
  await page.getByRole('button', { name: 'Not released yet' }).click({ force: true });
  await expect(page.getByRole('alert')).toContainText('The lead signs in on this tablet');
  await look(page, 'waits-for-lead');
  const run = page.url();
  await page.getByRole('button', { name: /kept|View/ }).click();
  await press(page, /To the Bench/);
  await page.context().setOffline(false);
  await signOut(page, 'I. Okafor');
  await signIn(page, 'adeyemi');
  await page.context().setOffline(true);
  await page.goto(run);
  await press(page, /Go on with step 5/);
  await page.getByLabel(/What it rests on/).fill('Secured with two clamps, seen.');
  await look(page, 'release');
  await press(page, 'Release');
  await expect(page.getByText('Released by R. Adeyemi')).toBeVisible();
  await expect(page.getByText('A second person has looked: T. Brandt')).toBeVisible();
  await look(page, 'released');
  await press(page, /Done,\s+go on/);
}

async function holdWithReadings(page: Page): Promise<void> {
  await at(page, '6');
  await expect(page.getByText('Gauge as it begins').first()).toBeVisible();
  await look(page, 'hold-begins');
  await enter(page, '6.0');
  await press(page, 'Start the clock');
  await page.getByRole('button', { name: /Held,\s+go on/ }).click({ timeout: 45_000 });
  await expect(page.getByText('Gauge as it ends').first()).toBeVisible();
  await enter(page, '5.7');
}

async function whereAndPhoto(page: Page): Promise<void> {
  await at(page, '7');
  await expect(page.locator('figcaption')).toHaveText(['At the charge cooler', 'At the throttle']);
  await look(page, 'choice-pictures');
  await page.getByRole('radio', { name: 'Nowhere' }).click();
  await press(page, /Record\s+and go on/);

  await at(page, '8');
  await expect(page.getByText('The whole plug, in focus.')).toBeVisible();
  await look(page, 'photo-empty');
  const camera = page.locator('bay-photo-entry input[type=file]');
  await expect(camera).toHaveAttribute('capture', 'environment');
  await camera.setInputFiles({ name: 'note.jpg', mimeType: 'image/jpeg', buffer: Buffer.from('no photo at all') });
  await expect(page.getByRole('alert')).toContainText('This file is no photo');
  const photo = await page.screenshot({ type: 'jpeg', quality: 70 });
  await camera.setInputFiles({ name: 'plug.jpg', mimeType: 'image/jpeg', buffer: photo });
  const shown = page.locator('bay-photo-entry img');
  await expect(shown).toHaveJSProperty('naturalWidth', 1280);
  await look(page, 'photo-taken');
  await press(page, 'Keep this photo');
  await expect(page.getByText('1 photo kept')).toBeVisible();
  await page.reload();
  await press(page, /Go on with step 8/);
  // The bytes are on the tablet: they are shown again.
  await expect(shown).toHaveJSProperty('naturalWidth', 1280);
  await look(page, 'photo-kept');
  await press(page, /Photo kept,\s+go on/);
}

async function rampWithoutMarks(page: Page): Promise<void> {
  await at(page, '9');
  await look(page, 'ramp-begin');
  await press(page, /Gauge at zero:\s+begin to raise/);
  // A ramp begins at rest: what is typed in its first second must be near zero.
  await page.waitForTimeout(1100);
  for (let points = 0; points < 4; points += 1) await press(page, '+ 1');
  await expect(page.locator('bay-judged-line')).toContainText('Highest pressure');
  await expect(page.getByRole('button', { name: /noise/i })).toHaveCount(0);
  await look(page, 'ramp');
  await press(page, /Keep the ramp\s+and go on/);
}

/** Sent once the network is back, and told in the Record room with the called steps and the photo. */
async function recordTellsIt(
  page: Page,
  databaseUrl: string,
  runId: string,
  events: readonly RunEvent[],
): Promise<void> {
  const photo = events.find((event) => event.type === 'photo-attached');
  await press(page, 'To the Bench');
  await page.context().setOffline(false);
  const kept = () =>
    rowsOf<{ status: string; bytes: Buffer | null }>(
      databaseUrl,
      'SELECT status, (SELECT bytes FROM attachment WHERE sha256 = $2) AS bytes FROM run WHERE run_id = $1',
      [runId, photo?.data.sha256],
    );
  await expect.poll(async () => (await kept())[0]?.bytes?.length ?? 0, { timeout: 30_000 }).toBe(photo?.data.bytes);
  const [row] = await kept();
  expect(row?.status).toBe('closed');
  expect(
    createHash('sha256')
      .update(row?.bytes ?? '')
      .digest('hex'),
  ).toBe(photo?.data.sha256);
  await page.goto(`/records/${runId}`);
  const story = page.locator('bay-story-table');
  for (const told of ['4.3', 'Plug hold test', 'T. Brandt', 'Secured with two clamps, seen.', 'A warm engine cools.']) {
    await expect(story).toContainText(told);
  }
  await expect(story.locator('img').first()).toHaveJSProperty('naturalWidth', 1280);
  if (folder !== undefined) await page.screenshot({ path: `${folder}/record.png`, fullPage: true });
}
