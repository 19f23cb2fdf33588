import { join } from 'node:path';
import type { Page } from '@playwright/test';
import { acknowledge, shownStep, tap, walkTo, type Answers } from './support/at-the-car';
import { bringChecker, measuredControls, sideways, troubleWithStop, violations } from './support/measured';
import { expect, test } from './support/test';
import { openVisit, signIn } from './support/visits';
import { rowsOf } from './support/what-is-kept';

const ramp = join(__dirname, '../reference/ramps/demo-warm-seals.csv');
const tablet = { width: 1280, height: 800 } as const;
const sizes = [tablet, { width: 800, height: 1280 }, { width: 360, height: 740 }] as const;
const gear: Answers = {
  gear: { gauge: 'G-12', scanTool: 'S-3', probe: 'L-2', barometer: 'B-1', thermometer: 'T-4' },
};

/** The screen fits each size, breaks no rule of accessibility, and keeps its contrast by night and in glare. */
async function checkScreen(page: Page, name: string): Promise<void> {
  for (const size of sizes) {
    await page.setViewportSize(size);
    expect.soft(await sideways(page), `${name} at ${size.width} x ${size.height}`).toEqual([]);
  }
  await page.setViewportSize(tablet);
  expect.soft(await violations(page), `${name} by day`).toEqual([]);
  for (const theme of ['night', 'glare']) {
    await page.evaluate((to) => (document.documentElement.dataset['theme'] = to), theme);
    expect.soft(await violations(page, ['color-contrast']), `${name}, ${theme}`).toEqual([]);
  }
  await page.evaluate(() => (document.documentElement.dataset['theme'] = 'day'));
}

test('each kind of screen fits a tablet both ways and a phone, breaks no rule of accessibility, and suits a glove', async ({
  page,
  product,
}) => {
  test.setTimeout(120_000);
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await bringChecker(page);
  await page.goto('/');
  await expect(page.getByRole('heading', { name: 'Sign in' })).toBeVisible();
  await checkScreen(page, 'sign-in');

  // A lead may enter every room.
  await signIn(page, 'adeyemi');
  await expect(page.locator('bay-ready-list')).toContainText(/[1-9]\d* procedure/);
  await checkScreen(page, 'Bench');

  await openVisit(page, {
    VIN: '7ZZFD9HA0NP310446',
    Make: 'Merrow',
    Model: 'Packhorse',
    'Repair order (RO)': '4490',
    Odometer: '152300',
    "Concern, in the customer's words": 'Whistle at idle, hesitates under load',
  });
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await expect(page.getByText('Procedures that fit')).toBeVisible();
  await checkScreen(page, 'Visit');

  await page.getByRole('button', { name: /Start the cold half/ }).click();
  // What comes before the procedure is read before its card can be confirmed, without scrolling.
  const deference = page.locator('bay-start-entry bay-hand-side .deference');
  for (const size of sizes) {
    await page.setViewportSize(size);
    await expect.soft(deference, `at ${size.width} x ${size.height}`).toBeInViewport({ ratio: 1 });
    await expect.soft(page.getByRole('button', { name: /All of this\s+is ready/ })).toBeInViewport({ ratio: 1 });
  }
  await checkScreen(page, 'start card');
  await walkTo(page, '2e', gear);
  await expect(page.locator('bay-number-pad')).toBeVisible();
  await checkScreen(page, 'reading step');
  const { keys, nearestToStop } = await measuredControls(page);
  expect(keys.map(({ name }) => name)).toHaveLength(12);
  for (const { name, widthMm, heightMm } of keys) {
    expect.soft(widthMm, `width of ${name}`).toBeGreaterThanOrEqual(20);
    expect.soft(heightMm, `height of ${name}`).toBeGreaterThanOrEqual(16);
  }
  expect.soft(nearestToStop.mm, `from Stop to ${nearestToStop.name}`).toBeGreaterThanOrEqual(13);

  const sent = () => rowsOf(product.databaseUrl, `SELECT 1 FROM run WHERE repair_order = '4490'`);
  await expect.poll(sent, { timeout: 20_000 }).toHaveLength(1);
  await page.goto('/records');
  await expect(page.locator('bay-record-table').getByText('4490').first()).toBeVisible();
  await checkScreen(page, 'Record room');
});

const coldMorning: Answers = {
  ...gear,
  read: { '2e': ['14', '13'], '4': ['1014'], '5': ['94.0'], '6': ['93.7'], '11a': ['14'], '15b': ['0.0'] },
  way: { '4': 'Altimeter setting' },
  codes: { '3': ['P0068 stored'], '18a': ['P0068 stored'], '19c': [] },
  choose: {
    '12b': ['It stayed quiet'],
    '18b': ['They are cleared'],
    '19': ['Both halves are done'],
    '19a': ['Nothing forbids driving'],
    '19b': ['Idle', 'Steady ride'],
  },
};

/** *Stop, supply off* can be tapped all over at each size, whatever stands beside it or is laid over the step. */
async function checkStop(page: Page, name: string): Promise<void> {
  for (const size of sizes) {
    await page.setViewportSize(size);
    expect.soft(await troubleWithStop(page), `Stop: ${name} at ${size.width} x ${size.height}`).toEqual([]);
  }
  await page.setViewportSize(tablet);
}

/** Types the gauge's figure on the pad. */
async function typePoint(page: Page, digits: string): Promise<void> {
  await tap(page.getByRole('button', { name: 'Type it' }));
  await expect(page.locator('bay-number-pad')).toBeVisible();
  for (const digit of digits) await page.keyboard.press(digit === '.' ? 'Period' : digit);
  await expect(page.locator('bay-reading-display .figure .num')).toHaveText(digits);
  await tap(page.getByRole('button', { name: /Record\s+the point/ }));
}

test('Stop can be tapped all over while listening, over a limit, on coming back and at the finding', async ({
  page,
}) => {
  test.setTimeout(180_000);
  await page.emulateMedia({ reducedMotion: 'reduce' });
  await signIn(page, 'adeyemi');
  await openVisit(page, {
    VIN: '7ZZFD9HA0NP310446',
    Make: 'Merrow',
    Model: 'Packhorse',
    'Repair order (RO)': '4491',
    Odometer: '152310',
    "Concern, in the customer's words": 'Whistle at idle',
  });
  await page.getByRole('button', { name: 'Keep the visit' }).click();
  await page.getByRole('button', { name: /Start the cold half/ }).click();
  await walkTo(page, '11', coldMorning);
  await checkStop(page, 'caution');
  await acknowledge(page, (await shownStep(page)).cautions?.length ?? 0);
  await checkStop(page, 'listen, at zero');

  const begin = page.getByRole('button', { name: /Gauge at zero/ });
  await tap(begin);
  await checkStop(page, 'listen');
  // What nobody expected is said over any page, and not over Stop.
  await page.evaluate(
    () =>
      void setTimeout(() => {
        throw new Error('made for this check');
      }),
  );
  const unexpected = page.getByRole('alert').filter({ hasText: 'Something went wrong here' });
  await expect(unexpected).toBeVisible();
  await checkStop(page, 'listen, after something went wrong');
  await unexpected.getByRole('button', { name: 'Go on' }).click();
  await expect(unexpected).toBeHidden();
  await tap(page.getByRole('button', { name: 'Type it' }));
  await checkStop(page, 'listen, the pad');
  await tap(page.getByRole('button', { name: 'Back to the steps' }));
  await page.reload();
  await expect(page.getByRole('button', { name: /Go on with step 11/ })).toBeVisible();
  await checkStop(page, 'resume');
  await tap(page.getByRole('button', { name: /Go on with step 11/ }));

  // On the stop itself there is none any more: both ways on are whole instead.
  await page.getByRole('button', { name: 'Stop, supply off' }).click();
  for (const size of sizes) {
    await page.setViewportSize(size);
    for (const name of [/^Back to step 11/, /^End as not completed/]) {
      await expect.soft(page.getByRole('button', { name })).toBeInViewport({ ratio: 1 });
    }
  }
  await page.setViewportSize(tablet);
  await tap(page.getByRole('button', { name: /^Back to step 11/ }));

  await typePoint(page, '34');
  await tap(page.getByRole('button', { name: '+ 1', exact: true }));
  await expect(page.getByRole('heading', { name: 'Limit exceeded' })).toBeVisible();
  await checkStop(page, 'limit');
  await tap(page.getByRole('button', { name: /It is done: back to step 11/ }));

  // The ramp begins anew by itself.
  await expect(begin).toBeVisible();
  await expect(page.getByRole('button', { name: '+ 1', exact: true })).toBeHidden();
  await tap(begin);
  await typePoint(page, '1');
  await tap(page.getByRole('button', { name: /The noise\s+begins/ }));
  await typePoint(page, '3');
  await tap(page.getByRole('button', { name: /The noise\s+stopped/ }));
  await typePoint(page, '3.5');
  await checkStop(page, 'listen, marked');
  await tap(page.getByRole('button', { name: 'Begin anew' }));
  await tap(page.getByRole('button', { name: 'Sure? Begin anew' }));
  await acknowledge(page, (await shownStep(page)).cautions?.length ?? 0);
  await page.getByRole('button', { name: 'Take a log of the scan tool instead' }).click();
  await checkStop(page, 'listen, a file');
  await page.locator('input[type=file]').setInputFiles(ramp);
  await tap(page.getByRole('button', { name: 'Take this series' }));
  await expect(page.getByText('Gauge at the mark')).toBeVisible();
  await checkStop(page, 'listen, the marks of a file');
  await tap(page.getByRole('button', { name: /Keep the mark/ }));
  await expect(page.locator('bay-listen-entry')).toBeHidden();
  await walkTo(page, 'the end', coldMorning);
  await expect(page.locator('bay-finding-entry')).toBeVisible();
  await checkStop(page, 'finding');
});
